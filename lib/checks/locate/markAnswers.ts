import { errorEllipse, reachInEllipse } from "@/lib/gnss/interference/bearingFix";
import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatNumber, formatQuantity } from "../formatQuantity";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markChoice } from "../markChoice";
import { markNumber } from "../markNumber";
import { PROBABILITY, type LocateTruth } from "./drawCase";
import { markArea, markPosition, placeText, sizeText } from "./ellipse-rows";
import { findReflection, fixWith } from "./findReflection";
import type { LocateParameters } from "./parameters";
import { locateQuantities } from "./quantities";
import { readEllipse } from "./readEllipse";

/** Sets a hand-in against where the transmitter stands and what the log allows. */
export function markAnswers(truth: LocateTruth, plan: CheckPlan<LocateParameters>, answers: Answers): Marking {
  const asked = askedQuantities(locateQuantities, plan);
  const read = readEllipse(answers);
  const mark = (quantity: AskedQuantity): MarkedRow => {
    if (quantity.id === "position") return markPosition(truth, quantity, read);
    if (quantity.id === "area") return markArea(truth, quantity, read);
    if (quantity.id === "reflection") return markReflection(truth, quantity, answers);
    return markReport(truth, quantity, answers);
  };
  return finishMarking({ id: "locate", version: 1 }, plan, asked, [...asked.values()].map(mark), workingsOf(truth));
}

const markReflection = ({ reflectionStop }: LocateTruth, quantity: AskedQuantity, answers: Answers): MarkedRow =>
  markNumber({
    quantity,
    typed: answerOf(answers, "report.reflection"),
    computed: reflectionStop,
    unit: "1",
    decimals: 0,
    tolerance: 0,
    toleranceText: "same",
    explain: () => ({
      errorClass: null,
      reason: `Without stop ${reflectionStop} the other bearings agree within their spreads; without any other they do not.`,
    }),
  });

function markReport(truth: LocateTruth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const right = { band: truth.band, presence: truth.isOffAtTimes ? "times" : "always", action: "report" }[quantity.id]!;
  const reasons: Readonly<Record<string, string>> = {
    band: `The frequency is ${formatQuantity(truth.frequencyMhz, "MHz", 2)}.`,
    presence: truth.isOffAtTimes
      ? "At some of the stops nothing was heard."
      : "Every stop of the log has a bearing and a level.",
    action:
      "Locating ends where somebody else's property begins: do not confront anybody, do not operate a device you find, transmit nothing.",
  };
  return markChoice({
    quantity,
    typed: answerOf(answers, `report.${quantity.id}`),
    right: [right],
    explain: () => ({ errorClass: quantity.id === "action" ? "unsafe act" : null, reason: reasons[quantity.id] }),
  });
}

function workingsOf({ transmitter, log, reflectionStop, best, ellipse }: LocateTruth): Marking["workings"] {
  const all = fixWith(log);
  const tried = findReflection(log);
  return [
    { label: "Transmitter", value: placeText(transmitter) },
    { label: "Reflection", value: `stop ${reflectionStop}; least sum of squares without stop ${tried.stop}` },
    {
      label: "Weighted least squares",
      value: `${placeText(best)}, sum of squares ${formatNumber(best.sumOfSquares, 1)}`,
    },
    { label: "95 % ellipse", value: sizeText(ellipse) },
    {
      label: "Transmitter in it",
      value: `at ${formatNumber(reachInEllipse(ellipse, transmitter), 2)} of the way to the edge`,
    },
    ...(all
      ? [
          {
            label: "With the reflection",
            value: `${placeText(all)}, sum of squares ${formatNumber(all.sumOfSquares, 1)}, ${sizeText(errorEllipse(all, PROBABILITY))}`,
          },
        ]
      : []),
  ];
}
