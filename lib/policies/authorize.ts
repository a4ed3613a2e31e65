import { ForbiddenError } from "@/lib/errors";

/** Refuse with a sentence, or narrow the type for the lines below. */
export function authorize(allowed: boolean, what: string): asserts allowed {
  if (!allowed) throw new ForbiddenError(`You may not ${what}.`);
}
