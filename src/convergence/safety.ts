/**
 * Safety factors of the grid convergence index: Roache, Verification and Validation in Computational
 * Science and Engineering (1998); Celik et al., J. Fluids Eng. 130, 078001 (2008).
 */
export const SAFETY_IN_WINDOW = 1.25;
export const SAFETY_OUTSIDE = 3;

/**
 * From the 95 % half-width of rounding, measured on eight runs, to 98 %: Student's t of seven degrees of freedom,
 * 2.998 / 2.365 (M. Abramowitz and I. Stegun, table 26.10). The limits of asymptotic ladders are to hold in 99 %,
 * and rounding is the larger part of the half-width in up to a third of them.
 */
export const TO_98_PERCENT = 1.27;
