import { answerOf, isBlank } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import type { Answers, MarkedRow } from "../kind";
import { markChoice } from "../markChoice";
import { markWord } from "../markWord";
import { INDICATIONS, type Indication } from "./quantities";

/** Both must be seen in the log; the second from another instrument than the first. */
export function markIndications(seen: readonly Indication[], quantity: AskedQuantity, answers: Answers): MarkedRow[] {
  const typed = { first: answerOf(answers, "finding.first"), second: answerOf(answers, "finding.second") };
  const computed = seen.map(labelOf).join("; ");
  const row = (label: string, text: string) =>
    markChoice({
      quantity,
      label,
      typed: text,
      right: seen,
      computed,
      explain: () => ({ errorClass: "not in the log", reason: `The log shows: ${computed}.` }),
    });
  const first = row("First indication", typed.first);
  const second = row("Second indication", typed.second);
  const instrument = instrumentOf(typed.second);
  if (!second.within || isBlank(typed.first) || instrument !== instrumentOf(typed.first)) return [first, second];
  const finding = { errorClass: "not independent", reason: `Both are read from one thing: ${instrument}.` };
  return [
    first,
    markWord({
      quantity,
      label: second.label,
      handedIn: second.handedIn,
      understood: second.handedIn,
      computed,
      finding,
    }),
  ];
}

const labelOf = (indication: string) => INDICATIONS.find(({ value }) => value === indication)!.label;

const instrumentOf = (typed: string) => INDICATIONS.find(({ value }) => value === typed.trim())?.instrument;
