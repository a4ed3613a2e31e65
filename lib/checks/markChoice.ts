import { isBlank } from "./answerOf";
import type { AskedQuantity } from "./askedQuantities";
import type { MarkedRow } from "./kind";
import type { Finding } from "./markNumber";
import { markWord } from "./markWord";

export type ChoiceLine = {
  quantity: AskedQuantity;
  subject?: string;
  label?: string;
  typed: string;
  /** Values that are right; the first is the one to print when `computed` is not given. */
  right: readonly string[];
  computed?: string;
  explain?: (value: string) => Finding;
};

/** Marks one word of a list. What is not in the list is outside, whoever sent it. */
export function markChoice({ quantity, subject, label, typed, right, computed, explain }: ChoiceLine): MarkedRow {
  const chosen = quantity.choices.find((choice) => choice.value === typed.trim());
  const expected = computed ?? labelOf(quantity, right[0]);
  const findingOf = (): Finding => {
    if (isBlank(typed)) return { errorClass: null, reason: "Nothing was handed in." };
    if (!chosen) return { errorClass: null, reason: `“${typed.trim()}” is not in the list.` };
    return explain?.(chosen.value) ?? { errorClass: null, reason: `Computed: ${expected}.` };
  };
  return markWord({
    quantity,
    subject,
    label,
    handedIn: chosen?.label ?? typed,
    understood: chosen?.label,
    computed: expected,
    finding: chosen && right.includes(chosen.value) ? null : findingOf(),
  });
}

const labelOf = (quantity: AskedQuantity, value: string) =>
  quantity.choices.find((choice) => choice.value === value)?.label ?? value;
