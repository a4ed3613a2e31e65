import { utcOf } from "@/lib/gnss/sky/receiverLog";
import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatQuantity } from "../formatQuantity";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markChoice } from "../markChoice";
import type { LostDecibelsTruth } from "./drawCase";
import { explainCause } from "./explainCause";
import { markAzimuths, markDepth, markMean } from "./level-rows";
import { markStart, markStop } from "./time-rows";
import type { LostDecibelsParameters } from "./parameters";
import { CAUSES, lostDecibelsQuantities } from "./quantities";

/** Sets a hand-in against what was put into the log. */
export function markAnswers(
  truth: LostDecibelsTruth,
  plan: CheckPlan<LostDecibelsParameters>,
  answers: Answers,
): Marking {
  const asked = askedQuantities(lostDecibelsQuantities, plan);
  const rows = [...asked.values()].flatMap((quantity) => rowsOf(truth, quantity, answers));
  return finishMarking({ id: "lost-decibels", version: 1 }, plan, asked, rows, workingsOf(truth));
}

function rowsOf(truth: LostDecibelsTruth, quantity: AskedQuantity, answers: Answers): MarkedRow[] {
  const typed = (field: string) => answerOf(answers, field);
  switch (quantity.id) {
    case "cause":
      return [
        markChoice({
          quantity,
          typed: typed("fault.cause"),
          right: [truth.cause],
          explain: (value) => explainCause(truth.cause, value),
        }),
      ];
    case "start":
      return [markStart(truth, quantity, answers)];
    case "stop":
      return [markStop(truth, quantity, answers)];
    case "azimuths":
      return markAzimuths(truth, quantity, answers);
    case "depth":
      return [markDepth(truth, quantity, answers)];
    case "act":
      return [markChoice({ quantity, typed: typed("fault.act"), right: [truth.cause] })];
    case "high":
      return [markMean(truth, quantity, typed("pattern.high"), truth.highDbHz)];
    default:
      return [markMean(truth, quantity, typed("pattern.low"), truth.lowDbHz)];
  }
}

function workingsOf({ cause, fault, log, allDbHz }: LostDecibelsTruth): Marking["workings"] {
  const label = CAUSES.find(({ value }) => value === cause)!.label;
  const dB = (value: number) => formatQuantity(value, "dB", 1);
  return [
    { label: "Put into the log", value: label },
    ...(fault
      ? [
          {
            label: "Readings touched",
            value: `${utcOf(log, fault.readings[0])} to ${utcOf(log, fault.readings[1])}${fault.slow ? ", growing evenly" : ""}`,
          },
          { label: "C/N0", value: `falls by ${dB(fault.depthDb)}` },
          { label: "Gain control", value: fault.gainDb === 0 ? "does not move" : `moves by ${dB(fault.gainDb)}` },
          {
            label: "Antenna current",
            value: fault.currentMa === 0 ? "does not move" : `moves by ${formatQuantity(fault.currentMa, "mA", 1)}`,
          },
        ]
      : []),
    { label: "Mean C/N0 over all elevations", value: formatQuantity(allDbHz, "dB-Hz", 1) },
  ];
}
