/** The call is wrong: an unknown name, flag or value. The message says which and what there is instead. */
export class UsageError extends Error {
  override name = "UsageError";
}
