/** A call that cannot be carried out: its message is all that a person needs; exit 2. */
export class CallError extends Error {
  override readonly name = "CallError";
}
