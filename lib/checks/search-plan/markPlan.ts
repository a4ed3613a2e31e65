import { falseAlarmOfThreshold, falseAlarmPerSearch } from "@/lib/gnss/detection";
import type { AskedQuantity } from "../askedQuantities";
import { formatDifference } from "../formatDifference";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { MarkedRow } from "../kind";
import { markWord } from "../markWord";
import type { Finding } from "../markNumber";
import type { Attained } from "./attain";
import type { SearchPlanTruth } from "./drawCase";
import { figures } from "./figures";
import { percent } from "./publicCase";
import type { ReadPlan } from "./readPlan";

type Judged = { computed: string; difference: string; tolerance: string; finding: Finding | null };
type Computable = { plan: NonNullable<ReadPlan["plan"]>; attained: Attained };

/** One of the three things that a plan has to attain, or why it could not be computed. */
export function markPlan(
  truth: SearchPlanTruth,
  quantity: AskedQuantity,
  read: ReadPlan,
  attained: Attained | null,
): MarkedRow {
  const judge = { detection: judgeDetection, falseAlarm: judgeFalseAlarm, time: judgeTime }[quantity.id];
  const computable = read.plan && attained ? { plan: read.plan, attained } : null;
  if (!judge || !computable) {
    const finding = { errorClass: null, reason: read.problem };
    return markWord({ quantity, handedIn: read.typed, computed: "not computed", tolerance: "", finding });
  }
  const { computed, difference, tolerance, finding } = judge(truth, quantity, computable);
  const row = markWord({
    quantity,
    handedIn: read.typed,
    understood: planText(computable.plan),
    computed,
    tolerance,
    finding,
  });
  return { ...row, difference };
}

const planText = ({ coherentMs, sums, dopplerBinHz, codeStepChips, thresholdSigma2 }: Computable["plan"]) =>
  [
    `${formatUnderstood(coherentMs, "ms")} × ${formatUnderstood(sums, "1")}`,
    formatUnderstood(dopplerBinHz, "Hz"),
    formatUnderstood(codeStepChips, "chip"),
    formatUnderstood(thresholdSigma2, "sigma2"),
  ].join(", ");

function judgeDetection(
  { requirement }: SearchPlanTruth,
  { tolerance }: AskedQuantity,
  { plan, attained }: Computable,
): Judged {
  const required = percent(requirement.detection);
  const attainedPercent = attained.detection * 100;
  return {
    computed: formatQuantity(attainedPercent, "%", 1),
    difference: `${formatDifference(attainedPercent - required, "1", 1)} points`,
    tolerance: `at least ${formatUnderstood(percent((required - tolerance) / 100), "%")}`,
    finding: attainedPercent >= required - tolerance ? null : explainDetection(required, plan, attained),
  };
}

function explainDetection(required: number, plan: Computable["plan"], { detection, lossless }: Attained): Finding {
  const attained = `Your plan detects ${formatQuantity(detection * 100, "%", 1)} of such satellites; ${formatUnderstood(required, "%")} is asked.`;
  if (plan.dopplerBinHz * plan.coherentMs > 1000) {
    const bin = `A bin of ${formatUnderstood(plan.dopplerBinHz, "Hz")} is wider than one over ${formatUnderstood(plan.coherentMs, "ms")}`;
    return {
      errorClass: "bin not shrunk with the coherent time",
      reason: `${attained} ${bin}, so signals between bins cancel themselves.`,
    };
  }
  if (lossless * 100 < required) {
    const best = formatQuantity(lossless * 100, "%", 1);
    return {
      errorClass: "too little added up",
      reason: `${attained} Even in the middle of its cell it would be ${best}: add up more.`,
    };
  }
  const without = `Without losses it would be ${formatQuantity(lossless * 100, "%", 1)}`;
  if (plan.coherentMs > 10) {
    return {
      errorClass: "bit edges not known",
      reason: `${attained} ${without}; data bits turn over inside sums as long as this.`,
    };
  }
  return {
    errorClass: "no mid-bin loss",
    reason: `${attained} ${without}; bin, code step and data bits take the rest.`,
  };
}

function judgeFalseAlarm(
  { requirement }: SearchPlanTruth,
  { tolerance }: AskedQuantity,
  computable: Computable,
): Judged {
  const required = requirement.falseAlarmPerSearch;
  const { falseAlarmPerSearch: attained } = computable.attained;
  return {
    computed: figures(attained),
    difference: `×\u00a0${figures(attained / required)}`,
    tolerance: `at most ${figures(required)}`,
    finding: attained <= required * (1 + tolerance / 100) ? null : explainFalseAlarm(required, computable),
  };
}

function explainFalseAlarm(required: number, { plan, attained }: Computable): Finding {
  const { falseAlarmPerCell: perCell, falseAlarmPerSearch: perSearch, cells } = attained;
  const inCells = `${figures(perCell)} in each of ${formatNumber(cells, 0)} cells is ${figures(perSearch)} in a search`;
  if (perCell >= required / 2 && perCell <= required * 2) {
    return { errorClass: "false alarm per cell", reason: `${inCells}; ${figures(required)} is allowed in a search.` };
  }
  const doubled = falseAlarmPerSearch(falseAlarmOfThreshold(2 * plan.thresholdSigma2, plan.sums), cells);
  const ofBoth = doubled <= required * 1.1 && doubled >= required / 4;
  return {
    errorClass: ofBoth ? "noise power of I and Q together" : null,
    reason: ofBoth
      ? "The threshold is half of what is needed: σ² is the noise power of I or of Q, not of both."
      : `${inCells}: raise the threshold.`,
  };
}

function judgeTime({ timeLimitS }: SearchPlanTruth, _: AskedQuantity, { plan, attained }: Computable): Judged {
  const { searchTimeS, cells } = attained;
  const limit = formatUnderstood(timeLimitS, "s");
  const sum = `${formatNumber(cells, 0)} cells of ${formatUnderstood(plan.coherentMs, "ms")} × ${formatUnderstood(plan.sums, "1")}`;
  const reason = `${sum} take ${figures(searchTimeS)}\u00a0s; ${limit} is allowed.`;
  return {
    computed: `${figures(searchTimeS)}\u00a0s`,
    difference: formatDifference(searchTimeS - timeLimitS, "s", searchTimeS < 10 ? 2 : 1),
    tolerance: `at most ${limit}`,
    finding: searchTimeS <= timeLimitS ? null : { errorClass: "too slow", reason },
  };
}
