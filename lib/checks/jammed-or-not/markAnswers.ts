import { utcOf } from "@/lib/gnss/sky/receiverLog";
import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatDifference } from "../formatDifference";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markChoice } from "../markChoice";
import { markNumber } from "../markNumber";
import { markTime } from "../markTime";
import type { JammedOrNotTruth } from "./drawCase";
import { explainVerdict } from "./explainVerdict";
import { markIndications } from "./markIndications";
import type { JammedOrNotParameters } from "./parameters";
import { jammedOrNotQuantities, VERDICTS } from "./quantities";

/** Sets a hand-in against what was put into the log. */
export function markAnswers(
  truth: JammedOrNotTruth,
  plan: CheckPlan<JammedOrNotParameters>,
  answers: Answers,
): Marking {
  const asked = askedQuantities(jammedOrNotQuantities, plan);
  const rows = [...asked.values()].flatMap((quantity) => rowsOf(truth, quantity, answers));
  return finishMarking({ id: "jammed-or-not", version: 1 }, plan, asked, rows, workingsOf(truth));
}

function rowsOf(truth: JammedOrNotTruth, quantity: AskedQuantity, answers: Answers): MarkedRow[] {
  const typed = answerOf(answers, `finding.${quantity.id}`);
  switch (quantity.id) {
    case "verdict":
      return [
        markChoice({
          quantity,
          typed,
          right: [truth.verdict],
          explain: (value) => explainVerdict(truth, value),
        }),
      ];
    case "start":
      return [markStart(truth, quantity, typed)];
    case "gainChange":
      return [markChange(quantity, typed, truth.event.gainDb)];
    case "cn0Change":
      return [markChange(quantity, typed, truth.cn0ChangeDb)];
    default:
      return markIndications(truth.event.seen, quantity, answers);
  }
}

function markStart({ event, alarm, log }: JammedOrNotTruth, quantity: AskedQuantity, typed: string): MarkedRow {
  const { intervalS, startUnixMs } = log;
  const near = (offS: number, reading: number) =>
    Math.abs(offS - (reading - event.first) * intervalS) <= quantity.tolerance;
  return markTime({
    quantity,
    typed,
    computedS: (startUnixMs / 1000 + event.first * intervalS) % 86_400,
    toleranceS: quantity.tolerance,
    explain: (offS) => {
      if (near(offS, alarm)) return { errorClass: "alarm taken for the start", reason: LATE_ALARM };
      if (event.pullsFrom !== event.first && near(offS, event.pullsFrom))
        return { errorClass: "pull taken for the start", reason: LATE_PULL };
      return null;
    },
  });
}

const LATE_ALARM = "This is the receiver's alarm. The instruments show it earlier.";
const LATE_PULL =
  "Clock or position left here. Gain control and C/N0 had changed before: the false signals were tracked by then.";

const markChange = (quantity: AskedQuantity, typed: string, computed: number): MarkedRow =>
  markNumber({
    quantity,
    typed,
    computed,
    unit: "dB",
    decimals: 1,
    tolerance: quantity.tolerance,
    explain: (value) =>
      Math.abs(value + computed) <= quantity.tolerance
        ? {
            errorClass: "sign",
            reason: `The size agrees; the sign does not. It went ${computed < 0 ? "down" : "up"}, so it is ${computed < 0 ? "negative" : "positive"}.`,
          }
        : null,
  });

function workingsOf({ verdict, event, cn0ChangeDb, alarm, log }: JammedOrNotTruth): Marking["workings"] {
  const dB = (value: number) => formatDifference(value, "dB", 1);
  return [
    { label: "Put into the log", value: VERDICTS.find(({ value }) => value === verdict)!.label },
    { label: "Start", value: `${utcOf(log, event.first)} UTC` },
    { label: "Alarm of the receiver", value: `${utcOf(log, alarm)} UTC` },
    { label: "Gain control", value: dB(event.gainDb) },
    { label: "C/N0, mean change", value: dB(cn0ChangeDb) },
    ...(event.clockNsS === 0
      ? []
      : [
          {
            label: "Clock",
            value: `${event.clockNsS.toFixed(2)}\u00a0ns in a second from ${utcOf(log, event.pullsFrom)}`,
          },
        ]),
    ...(event.speedMS[0] === 0
      ? []
      : [
          {
            label: "Position",
            value: `${Math.sqrt(event.speedMS[0] * event.speedMS[0] + event.speedMS[1] * event.speedMS[1]).toFixed(2)}\u00a0m in a second from ${utcOf(log, event.pullsFrom)}`,
          },
        ]),
  ];
}
