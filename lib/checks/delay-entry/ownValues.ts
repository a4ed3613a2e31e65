import { answerOf } from "../answerOf";
import type { Answers } from "../kind";
import { parseQuantity } from "../parseQuantity";
import { runOfEchoesNs } from "./budget";
import type { DelayEntryTruth } from "./drawCase";

/** The candidate's own earlier values that later ones are judged from; null where there is none that can be. */
export type OwnValues = {
  runNs: number | null;
  delaysNs: (number | null)[];
  sumNs: number | null;
  totalNs: number | null;
};

export function ownValues({ parts, totalNs }: DelayEntryTruth, answers: Answers): OwnValues {
  const read = (id: string) => {
    const reading = parseQuantity(answerOf(answers, id), "ns");
    return "value" in reading ? reading.value : null;
  };
  const [leadNs, endNs] = [read("trace.lead"), read("trace.end")];
  const runNs = leadNs === null || endNs === null || !(endNs > leadNs) ? null : runOfEchoesNs(leadNs, endNs);
  const delaysNs = parts.map(({ id }) => read(`parts.${id}`));
  const sumNs = delaysNs.reduce((sum, ns) => (sum === null || ns === null ? null : sum + ns), 0);
  const own = read("entry.total");
  // A total near 0 has no sign that could be judged.
  return { runNs, delaysNs, sumNs, totalNs: own !== null && own >= LEAST_SHARE * totalNs ? own : null };
}

const LEAST_SHARE = 0.2;
