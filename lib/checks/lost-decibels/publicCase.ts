import { askedQuantities } from "../askedQuantities";
import { formatUnderstood } from "../formatUnderstood";
import type { CheckPlan, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import { logTimes, shownLog } from "../receiver-log/shownLog";
import type { LostDecibelsTruth } from "./drawCase";
import type { LostDecibelsParameters } from "./parameters";
import { ACTS, CAUSES, lostDecibelsCautions, lostDecibelsQuantities } from "./quantities";

export const LOG_FILE = "receiver-log.nmea";
export const COLUMNS_FILE = "gain-and-current.csv";

/** Field by field. The form is the same whatever happened, and when nothing did. */
export function publicCase(
  { log, gainDb, currentMa }: LostDecibelsTruth,
  plan: CheckPlan<LostDecibelsParameters>,
): PublicCase {
  const asked = askedQuantities(lostDecibelsQuantities, plan);
  return {
    kind: "lost-decibels",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Signal", value: "GPS L1 C/A" },
      ...logTimes(log),
      { label: "Antenna", value: "fixed, with an amplifier fed through the cable" },
      { label: "C/N0 in the log", value: "whole dB-Hz, empty when not tracked" },
    ],
    cautions: [...lostDecibelsCautions],
    sections: [
      { id: "fault", title: "What happened", fields: FAULT_FIELDS.filter(({ quantity }) => asked.has(quantity)) },
      {
        id: "pattern",
        title: "Without the fault",
        fields: PATTERN_FIELDS.filter(({ quantity }) => asked.has(quantity)),
      },
    ].filter(({ fields }) => fields.length > 0),
    tolerances: publicTolerances(asked, {
      start: ({ tolerance }) => `±${formatUnderstood(tolerance, "s")}; of a slow fall ± a tenth of its length`,
      azimuths: ({ tolerance }) => `±${formatUnderstood(tolerance, "deg")} at either edge`,
    }),
    data: {
      log: shownLog(log),
      gainDb: [...gainDb],
      currentMa: [...currentMa],
      logFile: LOG_FILE,
      columnsFile: COLUMNS_FILE,
    },
  };
}

const BRIEF = [
  "The log is of a fixed receiver: C/N0, elevation and azimuth of every satellite, the gain control and the current of the antenna feed. At most one thing went wrong.",
  "Gain control is the gain that the receiver sets for itself: up when less power comes in, down when more comes in.",
  "Start is the first reading that is touched and stop the last one, in UTC. What lasts to the end of the log stops with its last reading. A slow fall starts where it leaves the level of before.",
  "Azimuths go clockwise: from 300° to 40° goes through north. All round is 0° to 360°. Depth is how far C/N0 fell below what the elevation explains; of a slow fall, at its last reading.",
  "If nothing is wrong, write none for both times and 0 for both azimuths and the depth.",
  "The two means are of the figures in dB-Hz, over all satellites and the whole log, without the readings from start to stop.",
];

const FAULT_FIELDS: readonly FieldSpec[] = [
  { id: "cause", label: "Cause", input: "choice", choices: CAUSES, quantity: "cause" },
  { id: "start", label: "Start, UTC", input: "text", help: "As 14:03:30, or none.", quantity: "start" },
  { id: "stop", label: "Stop, UTC", input: "text", help: "As 14:03:30, or none.", quantity: "stop" },
  { id: "azimuthFrom", label: "From azimuth", input: "number", unit: "deg", quantity: "azimuths" },
  { id: "azimuthTo", label: "Clockwise to azimuth", input: "number", unit: "deg", quantity: "azimuths" },
  { id: "depth", label: "Depth of the fall", input: "number", unit: "dB", quantity: "depth" },
  { id: "act", label: "Next act on site", input: "choice", choices: ACTS, quantity: "act" },
];

const PATTERN_FIELDS: readonly FieldSpec[] = [
  { id: "high", label: "Mean C/N0 above 60°", input: "number", unit: "dB-Hz", quantity: "high" },
  { id: "low", label: "Mean C/N0 from 10° to 20°", input: "number", unit: "dB-Hz", quantity: "low" },
];
