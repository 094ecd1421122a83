/** What the exit codes of every command mean. */
export const EXIT = { done: 0, gateClosed: 1, inputWrong: 2, internalFailure: 3, interrupted: 130 } as const;

/** A process that several things go wrong in leaves with the gravest. */
export function leaveWith(code: number): void {
  process.exitCode = Math.max(Number(process.exitCode ?? 0), code);
}
