import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatDifference } from "../formatDifference";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markChoice } from "../markChoice";
import type { PulseAcceptanceTruth } from "./drawCase";
import { markFigure } from "./figure-rows";
import type { PulseAcceptanceParameters } from "./parameters";
import { pulseAcceptanceQuantities } from "./quantities";
import { markStep, stepMinutes } from "./step-rows";

/** Sets a hand-in against the log's own figures. */
export function markAnswers(
  truth: PulseAcceptanceTruth,
  plan: CheckPlan<PulseAcceptanceParameters>,
  answers: Answers,
): Marking {
  const asked = askedQuantities(pulseAcceptanceQuantities, plan);
  const rows = [...asked.values()].flatMap((quantity): MarkedRow | MarkedRow[] => {
    if (quantity.id === "verdict") return markVerdict(truth, quantity, answers);
    return quantity.id === "step" ? markStep(truth, quantity, answers) : markFigure(truth, quantity, answers);
  });
  return finishMarking({ id: "pulse-acceptance", version: 1 }, plan, asked, rows, workingsOf(truth));
}

/** From the log, not from the candidate's own max|TE|: a wrong verdict is wrong however it came about. */
function markVerdict(
  { accepted, figures, limitNs }: PulseAcceptanceTruth,
  quantity: AskedQuantity,
  answers: Answers,
): MarkedRow {
  const side = accepted ? "not above" : "above";
  return markChoice({
    quantity,
    typed: answerOf(answers, "verdict.kept"),
    right: [accepted ? "accept" : "refuse"],
    explain: () => ({
      errorClass: accepted ? "refused within the limit" : "accepted above the limit",
      reason: `max|TE| is ${formatQuantity(figures.maxTeNs, "ns", 1)}, ${side} the limit of ${formatUnderstood(limitNs, "ns")}.`,
    }),
  });
}

function workingsOf(truth: PulseAcceptanceTruth): Marking["workings"] {
  const { figures, intervals, shape, startCableNs, stopCableNs, intervalS } = truth;
  const leadsNs = stopCableNs - startCableNs;
  const missed = shape.triggers.map(({ index }) => formatQuantity((index * intervalS) / 60, "min", 1));
  return [
    { label: "Taken off each reading", value: formatDifference(leadsNs, "ns", 1) },
    { label: "Missed triggers", value: missed.length === 0 ? "none" : `at ${missed.join(", ")}` },
    { label: "Readings that count", value: formatNumber(truth.readingsNs.length - missed.length, 0) },
    { label: "Mean", value: formatDifference(figures.meanNs, "ns", 2) },
    { label: "max|TE|", value: formatQuantity(figures.maxTeNs, "ns", 1) },
    { label: "Standard deviation", value: formatQuantity(figures.deviationNs, "ns", 2) },
    {
      label: `MTIE over ${formatUnderstood(intervals.shortS, "s")}`,
      value: formatQuantity(figures.mtieShortNs, "ns", 1),
    },
    {
      label: `MTIE over ${formatUnderstood(intervals.longS, "s")}`,
      value: formatQuantity(figures.mtieLongNs, "ns", 1),
    },
    {
      label: "Step",
      value: shape.step
        ? `${formatDifference(shape.step.sizeNs, "ns", 1)} at ${formatQuantity(stepMinutes(truth)!, "min", 1)}`
        : "none",
    },
  ];
}
