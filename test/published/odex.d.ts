// What is used here of odex 2.0.4, whose own types are its source.
export class Solver {
  constructor(dimension: number);
  absoluteTolerance: number;
  relativeTolerance: number;
  maxSteps: number;
  solve(
    slopes: (x: number, y: number[]) => number[],
    x: number,
    y: number[],
    end: number,
  ): { readonly y: readonly number[] };
}
