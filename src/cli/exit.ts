/** What the exit codes of every command mean; one that a signal ends leaves with `signal` and its number. */
export const EXIT = { done: 0, gateClosed: 1, inputWrong: 2, internalFailure: 3, signal: 128 } as const;

/** A process that several things go wrong in leaves with the gravest. */
export function leaveWith(code: number): void {
  process.exitCode = Math.max(Number(process.exitCode ?? 0), code);
}
