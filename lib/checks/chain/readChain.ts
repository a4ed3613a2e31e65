import { answerOf, isBlank } from "../answerOf";
import type { Answers } from "../kind";
import type { Part, Site } from "./site";

export const MOST_PARTS = 8;

/** `chain` is empty when it cannot be computed; `problem` says why. */
export type ReadChain = { typed: string; chain: Part[]; problem: string };

/** The parts as handed in, antenna first; empty rows are passed over. */
export function readChain(answers: Answers, { parts }: Site): ReadChain {
  const named = Array.from({ length: MOST_PARTS }, (_, n) => answerOf(answers, `chain.${n + 1}.part`).trim());
  const given = named.filter((text) => !isBlank(text));
  const typed = given.join(", ");
  if (given.length === 0) return { typed, chain: [], problem: "Nothing was handed in." };
  const chain: Part[] = [];
  for (const id of given) {
    const part = parts.find((one) => one.id === id);
    if (!part) return { typed, chain: [], problem: `“${id.slice(0, 40)}” is not on the list of parts.` };
    chain.push(part);
  }
  return { typed, chain, problem: "" };
}
