import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, MarkedRow } from "../kind";
import { markChoice } from "../markChoice";
import type { Finding } from "../markNumber";
import type { SkyViewTruth } from "./drawCase";
import { NONE } from "./quantities";
import type { Surveyed } from "./survey";

/** The verdict, whatever the figures: the survey's own choice or outside. */
export const markPosition = (truth: SkyViewTruth, quantity: AskedQuantity, answers: Answers): MarkedRow =>
  markChoice({
    quantity,
    typed: answerOf(answers, "verdict.choice"),
    right: [truth.choice],
    explain: (value) => explainChoice(truth, value),
  });

function explainChoice({ surveyed, rules, choice }: SkyViewTruth, value: string): Finding {
  const taken = surveyed.find(({ id }) => id === value);
  if (value === NONE || !taken)
    return { errorClass: "fit position refused", reason: `Position ${choice} keeps both limits and all distances.` };
  if (taken.roomM < 0) {
    const reason = `Position ${value} stands ${formatQuantity(-taken.roomM, "m", 1)} too near the ${taken.tightest}.`;
    return { errorClass: "emitter overlooked", reason };
  }
  if (!(taken.blockedPercent <= rules.totalPercent))
    return overLimit(value, taken.blockedPercent, rules.totalPercent, "");
  const quadrantPercent = taken.quadrantsPercent[taken.worst];
  if (!taken.fits) return overLimit(value, quadrantPercent, rules.quadrantPercent, " in one quadrant");
  const best = surveyed.find(({ id }) => id === choice) as Surveyed;
  const [own, least] = [taken, best].map(({ blockedPercent }) => formatQuantity(blockedPercent, "%", 1));
  return {
    errorClass: "not the best of those that will do",
    reason: `Position ${value} will do with ${own} blocked; position ${choice} has ${least}.`,
  };
}

const overLimit = (id: string, percent: number, limit: number, where: string): Finding => ({
  errorClass: where === "" ? "limit in all broken" : "limit in one quadrant broken",
  reason: `Position ${id} has ${formatQuantity(percent, "%", 1)} blocked${where}; ${formatUnderstood(limit, "%")} is allowed.`,
});
