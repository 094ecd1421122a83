/**
 * Infinity as a parameter, where the null run has it: splitting a double in two makes no sense of an infinite
 * one. Against any speed of an orbit this is as good, to far more digits than there are.
 */
const FAR = 2 ** 300;

export const withoutInfinity = (value: number): number =>
  Number.isFinite(value) ? value : Math.sign(value) * FAR;
