import type { AskedQuantity } from "./askedQuantities";
import { isBlank } from "./answerOf";
import type { MarkedRow } from "./kind";
import type { Finding } from "./markNumber";

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
export function markChoice(line: ChoiceLine): MarkedRow {
  const chosen = line.quantity.choices.find((choice) => choice.value === line.typed.trim());
  const within = chosen !== undefined && line.right.includes(chosen.value);
  const finding = within ? null : findingOf(line, chosen?.value);
  return {
    quantity: line.quantity.id,
    subject: line.subject ?? null,
    label: line.label ?? line.quantity.label,
    handedIn: chosen?.label ?? line.typed,
    understood: chosen?.label ?? null,
    computed: line.computed ?? labelOf(line, line.right[0]),
    difference: null,
    tolerance: "same",
    offByTolerances: null,
    within,
    critical: line.quantity.critical,
    errorClass: finding?.errorClass ?? null,
    reason: finding?.reason ?? null,
  };
}

function findingOf(line: ChoiceLine, value: string | undefined): Finding {
  if (isBlank(line.typed)) return { errorClass: null, reason: "Nothing was handed in." };
  if (value === undefined) return { errorClass: null, reason: `“${line.typed.trim()}” is not in the list.` };
  return (
    line.explain?.(value) ?? { errorClass: null, reason: `Computed: ${line.computed ?? labelOf(line, line.right[0])}.` }
  );
}

const labelOf = (line: ChoiceLine, value: string) =>
  line.quantity.choices.find((choice) => choice.value === value)?.label ?? value;
