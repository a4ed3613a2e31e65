import { log } from "@/lib/numeric/elementary";
import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import { markWord } from "../markWord";
import { parseQuantity } from "../parseQuantity";
import type { Attained } from "./attain";
import { figures } from "./figures";
import type { ReadPlan } from "./readPlan";

const FIELD_OF: Readonly<Record<string, string>> = {
  ownDetection: "estimate.detection",
  ownFalseAlarm: "estimate.falseAlarm",
  ownTime: "estimate.time",
};

/** The candidate's own estimate against what the plan attains, whatever the requirement. */
export function markEstimate(
  quantity: AskedQuantity,
  answers: Answers,
  { plan, problem }: ReadPlan,
  attained: Attained | null,
): MarkedRow {
  const typed = answerOf(answers, FIELD_OF[quantity.id]);
  if (!plan || !attained) {
    const finding = { errorClass: null, reason: `There is no plan to compare with. ${problem}` };
    return markWord({ quantity, handedIn: typed, computed: "not computed", tolerance: "", finding });
  }
  if (quantity.id === "ownDetection") return markOwnDetection(quantity, typed, attained);
  if (quantity.id === "ownFalseAlarm") return markOwnFalseAlarm(quantity, typed, attained);
  return markOwnTime(quantity, typed, attained, plan.sums);
}

const markOwnDetection = (quantity: AskedQuantity, typed: string, { detection, lossless }: Attained): MarkedRow =>
  markNumber({
    quantity,
    typed,
    computed: detection * 100,
    unit: "%",
    decimals: 1,
    tolerance: quantity.tolerance,
    explain: (value) => {
      if (Math.abs(value - detection) <= quantity.tolerance / 100) {
        return { errorClass: "fraction for per cent", reason: "The field is in per cent." };
      }
      if (!(Math.abs(value - lossless * 100) <= 2)) return null;
      const reason = `This is the detection without losses, ${formatQuantity(lossless * 100, "%", 1)}; bin, code step and data bits take some.`;
      return { errorClass: "no mid-bin loss", reason };
    },
  });

/** A factor, so differences are counted in logarithms. */
function markOwnFalseAlarm(quantity: AskedQuantity, typed: string, attained: Attained): MarkedRow {
  const computed = attained.falseAlarmPerSearch;
  const allowed = quantity.tolerance;
  const reading = parseQuantity(typed, "1");
  const ratio = "value" in reading ? reading.value / computed : NaN;
  const within = ratio >= 1 / allowed && ratio <= allowed;
  const row = markWord({
    quantity,
    handedIn: typed,
    understood: "value" in reading ? formatUnderstood(reading.value, "1") : undefined,
    computed: figures(computed),
    tolerance: `factor ${formatUnderstood(allowed, "1")}`,
    finding: within
      ? null
      : "problem" in reading
        ? { errorClass: null, reason: reading.problem }
        : explainOwnFalseAlarm(reading.value, attained),
  });
  const measurable = ratio > 0 && ratio < Infinity;
  return {
    ...row,
    difference: measurable ? `×\u00a0${figures(ratio)}` : null,
    offByTolerances: measurable ? log(ratio) / log(allowed) : null,
  };
}

function explainOwnFalseAlarm(value: number, { falseAlarmPerCell, falseAlarmPerSearch, cells }: Attained): Finding {
  const perCell = value >= falseAlarmPerCell / 2 && value <= falseAlarmPerCell * 2;
  const reason = `${figures(falseAlarmPerCell)} in each of ${formatNumber(cells, 0)} cells is ${figures(falseAlarmPerSearch)} in a search.`;
  return { errorClass: perCell ? "false alarm per cell" : null, reason };
}

const markOwnTime = (
  quantity: AskedQuantity,
  typed: string,
  { searchTimeS, cells }: Attained,
  sums: number,
): MarkedRow =>
  markNumber({
    quantity,
    typed,
    computed: searchTimeS,
    unit: "s",
    decimals: searchTimeS < 10 ? 2 : 1,
    tolerance: (quantity.tolerance / 100) * searchTimeS,
    explain: (value) => {
      const near = (other: number) => Math.abs(value - other) <= (quantity.tolerance / 100) * other;
      if (near(searchTimeS / 2))
        return {
          errorClass: "half of the window",
          reason: `The window is ± its half width: ${formatNumber(cells, 0)} cells.`,
        };
      if (sums > 1 && near(searchTimeS / sums))
        return { errorClass: "number of sums left out", reason: "Each cell takes all of its coherent sums." };
      return null;
    },
  });
