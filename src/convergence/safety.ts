/**
 * Safety factors of the grid convergence index: Roache, Verification and Validation in Computational
 * Science and Engineering (1998); Celik et al., J. Fluids Eng. 130, 078001 (2008).
 */
export const SAFETY_IN_WINDOW = 1.25;
export const SAFETY_OUTSIDE = 3;

/**
 * From the 95 % half-width of rounding, measured on eight runs, to the 99 % that a limit is held to: Student's
 * t of seven degrees of freedom, 3.499 / 2.365 (M. Abramowitz and I. Stegun, table 26.10).
 */
export const TO_99_PERCENT = 1.48;
