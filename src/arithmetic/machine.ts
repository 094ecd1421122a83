/**
 * Operations on doubles, each rounded once to nearest (IEEE 754). With numbers for `T` an algorithm computes;
 * with names of a program's variables it writes the program that computes: one text for both.
 */
export interface Machine<T> {
  constant(value: number): T;
  add(a: T, b: T): T;
  subtract(a: T, b: T): T;
  multiply(a: T, b: T): T;
  divide(a: T, b: T): T;
  sqrt(a: T): T;
}

export const onNumbers: Machine<number> = {
  constant: (value) => value,
  add: (a, b) => a + b,
  subtract: (a, b) => a - b,
  multiply: (a, b) => a * b,
  divide: (a, b) => a / b,
  sqrt: Math.sqrt,
};
