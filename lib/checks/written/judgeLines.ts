import { answerOf } from "../answerOf";
import { askedQuantities } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import type { Answers, CheckPlan, Marking } from "../kind";
import { markWord } from "../markWord";
import type { WrittenParameters } from "./parameters";
import { SECTION } from "./publicCase";
import { writtenQuantities } from "./quantities";

/** What an assessor says of one line; a reason is given for every line outside. */
export type Verdict = { of: string; within: boolean; reason: string };

/**
 * The marking record that a person's verdicts make.
 * @throws RangeError unless every line has its one verdict, and every one outside its reason
 */
export function judgeLines(
  plan: CheckPlan<WrittenParameters>,
  answers: Answers,
  verdicts: readonly Verdict[],
): Marking {
  const asked = askedQuantities(writtenQuantities(plan), plan);
  const byLine = new Map(verdicts.map((verdict) => [verdict.of, verdict]));
  if (byLine.size !== verdicts.length || byLine.size !== asked.size) {
    throw new RangeError(`judgeLines: ${asked.size} lines need a verdict each, got ${verdicts.length}`);
  }
  const rows = [...asked.values()].map((quantity) => {
    const verdict = byLine.get(quantity.id);
    if (!verdict) throw new RangeError(`judgeLines: no verdict on ${quantity.id}`);
    const reason = verdict.reason.trim();
    if (!verdict.within && reason === "") throw new RangeError(`judgeLines: no reason for ${quantity.id}`);
    const row = markWord({
      quantity,
      handedIn: answerOf(answers, `${SECTION}.${quantity.id}`),
      computed: "judged by a person",
      tolerance: "judged",
      finding: verdict.within ? null : { errorClass: null, reason },
    });
    return verdict.within && reason !== "" ? { ...row, reason } : row;
  });
  return finishMarking({ id: "written", version: 1 }, plan, asked, rows, []);
}
