import type { AskedQuantity } from "./askedQuantities";
import type { MarkedRow } from "./kind";
import type { Finding } from "./markNumber";

export type WordLine = {
  quantity: AskedQuantity;
  subject?: string;
  label?: string;
  handedIn: string;
  understood?: string;
  computed: string;
  tolerance?: string;
  /** Null when the word is right. */
  finding: Finding | null;
};

/** A row without a number: nothing to subtract, so no difference and no gauge. */
export const markWord = (line: WordLine): MarkedRow => ({
  quantity: line.quantity.id,
  subject: line.subject ?? null,
  label: line.label ?? line.quantity.label,
  handedIn: line.handedIn,
  understood: line.understood ?? null,
  computed: line.computed,
  difference: null,
  tolerance: line.tolerance ?? "same",
  offByTolerances: null,
  within: line.finding === null,
  critical: line.quantity.critical,
  errorClass: line.finding?.errorClass ?? null,
  reason: line.finding?.reason ?? null,
});
