import { utcOf } from "@/lib/gnss/sky/receiverLog";
import { ALARM } from "./alarmOf";
import { askedQuantities } from "../askedQuantities";
import type { CheckPlan, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import { logTimes, shownLog } from "../receiver-log/shownLog";
import type { JammedOrNotTruth } from "./drawCase";
import type { JammedOrNotParameters } from "./parameters";
import { INDICATIONS, jammedOrNotCautions, jammedOrNotQuantities, VERDICTS } from "./quantities";

export const LOG_FILE = "receiver-log.nmea";
export const COLUMNS_FILE = "instruments.csv";

/** Field by field. The form is the same whatever happened. */
export function publicCase(
  { log, columns, alarm }: JammedOrNotTruth,
  plan: CheckPlan<JammedOrNotParameters>,
): PublicCase {
  const asked = askedQuantities(jammedOrNotQuantities, plan);
  return {
    kind: "jammed-or-not",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Signal", value: "GPS L1 C/A" },
      { label: "Receiver", value: "fixed, gives time to a station" },
      ...logTimes(log),
      { label: ALARM, value: `${utcOf(log, alarm)} UTC` },
    ],
    cautions: [...jammedOrNotCautions],
    sections: [{ id: "finding", title: "What happened", fields: FIELDS.filter(({ quantity }) => asked.has(quantity)) }],
    tolerances: publicTolerances(asked, { indications: () => "both seen, from two instruments" }),
    data: {
      log: shownLog(log),
      gainDb: [...columns.gainDb],
      clockNs: [...columns.clockNs],
      eastM: [...columns.eastM],
      northM: [...columns.northM],
      upM: [...columns.upM],
      dopplerMeanHz: [...columns.dopplerMeanHz],
      dopplerSpreadHz: [...columns.dopplerSpreadHz],
      logFile: LOG_FILE,
      columnsFile: COLUMNS_FILE,
    },
  };
}

const BRIEF = [
  "Something happened to this receiver once, and lasts to the end of the log. The clock is held against the station's own oscillator, the position against the survey, the Dopplers against their prediction for the surveyed place.",
  "Gain control is the gain that the receiver sets for itself: up when less power comes in, down when more comes in.",
  "Start is the first reading at which any instrument shows it, in UTC. The receiver's own alarm comes later.",
  "The change of the gain control is the level after the start less the level before; 0 when it stayed. The change of C/N0 goes from the minute that ends 20 s before the start to the minute that begins 20 s after it, as the mean over the satellites that are tracked through both. Both carry their sign.",
  "Name two indications that you see in the log and that do not depend on one another. A clock that runs and Dopplers that shift alike are one thing; so are a position that moves and Dopplers that draw apart.",
];

const CHOICES = INDICATIONS.map(({ value, label }) => ({ value, label }));

const FIELDS: readonly FieldSpec[] = [
  { id: "verdict", label: "Verdict", input: "choice", choices: VERDICTS, quantity: "verdict" },
  { id: "start", label: "Start, UTC", input: "text", help: "As 14:03:30.", quantity: "start" },
  {
    id: "gainChange",
    label: "Change of the gain control",
    input: "number",
    unit: "dB",
    signed: true,
    quantity: "gainChange",
  },
  { id: "cn0Change", label: "Mean change of C/N0", input: "number", unit: "dB", signed: true, quantity: "cn0Change" },
  { id: "first", label: "First indication", input: "choice", choices: CHOICES, quantity: "indications" },
  { id: "second", label: "Second, independent of it", input: "choice", choices: CHOICES, quantity: "indications" },
];
