import { askedQuantities } from "../askedQuantities";
import { formatNumber } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CaseFile, CheckPlan, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import { BANDS } from "./bands";
import type { LocateTruth } from "./drawCase";
import { AREA_M } from "./drawPlaces";
import type { LocateParameters } from "./parameters";
import { ACTION_CHOICES, locateCautions, locateQuantities, PRESENCE_CHOICES } from "./quantities";

const LOG_FILE = "patrol.csv";

/** Field by field: the log, and nothing of where it points. */
export function publicCase({ log, frequencyMhz }: LocateTruth, plan: CheckPlan<LocateParameters>): PublicCase {
  const asked = askedQuantities(locateQuantities, plan);
  const own = (fields: readonly FieldSpec[]) => fields.filter(({ quantity }) => asked.has(quantity));
  const hasEllipse = asked.has("position") || asked.has("area");
  return {
    kind: "locate",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Grid", value: "local, metres east and north; bearings clockwise from grid north" },
      { label: "Area", value: `about ${formatNumber(AREA_M / 1000, 0)}\u00a0km each way` },
      { label: "Frequency", value: formatUnderstood(frequencyMhz, "MHz") },
      { label: "Stops", value: String(log.length) },
    ],
    cautions: [...locateCautions],
    sections: [
      { id: "fix", title: "Position and 95 % ellipse", fields: hasEllipse ? FIX_FIELDS : [] },
      { id: "report", title: "Report to the authority", fields: own(REPORT_FIELDS) },
    ].filter(({ fields }) => fields.length > 0),
    tolerances: publicTolerances(asked, {
      position: () => "inside",
      area: ({ tolerance }) => `at most ${formatUnderstood(tolerance, "1")} times the least that the log allows`,
    }),
    data: {
      logFile: LOG_FILE,
      frequencyMhz,
      log: log.map(({ stop, timeUtc, eastM, northM, bearingDeg, spreadDeg, levelDbm }) => ({
        stop,
        timeUtc,
        eastM,
        northM,
        bearingDeg,
        spreadDeg,
        levelDbm,
      })),
    },
  };
}

/** The same log, with a row of units, for a spreadsheet. */
export function logFile({ log }: LocateTruth): CaseFile {
  const rows = log.map(({ stop, timeUtc, eastM, northM, bearingDeg, spreadDeg, levelDbm }) =>
    [stop, timeUtc, eastM, northM, bearingDeg ?? "", spreadDeg ?? "", levelDbm ?? ""].join(","),
  );
  const text = ["stop,time,east,north,bearing,spread,level", ",UTC,m,m,deg,deg,dBm", ...rows, ""].join("\r\n");
  return { name: LOG_FILE, mediaType: "text/csv", bytes: new TextEncoder().encode(text) };
}

const BRIEF = [
  "A patrol has listened for an interferer from several stops. Say where it stands, with an ellipse that holds it with 95 % probability, and fill in the report.",
  "Each bearing has a standard deviation, its spread; errors of different stops are independent. One of the stops saw a reflection, and its bearing points elsewhere. Where nothing was heard, the log has no bearing.",
  "Weighted least squares: the best place has the least sum of squares, each bearing's miss counted in its own spreads. The 95 % ellipse runs where that sum is 5.99 above its least.",
  "Stay on public ground. Do not confront anybody, and do not operate a device that you find.",
  "Levels change by many dB behind buildings. The transmitter's power is not known.",
];

const FIX_FIELDS: readonly FieldSpec[] = [
  { id: "east", label: "East", input: "number", unit: "m", quantity: "position" },
  { id: "north", label: "North", input: "number", unit: "m", quantity: "position" },
  { id: "major", label: "Long half axis of the ellipse", input: "number", unit: "m", quantity: "area" },
  { id: "minor", label: "Short half axis", input: "number", unit: "m", quantity: "area" },
  {
    id: "azimuth",
    label: "Direction of the long axis",
    input: "number",
    unit: "deg",
    help: "Clockwise from grid north.",
    quantity: "position",
  },
];

const REPORT_FIELDS: readonly FieldSpec[] = [
  { id: "reflection", label: "Stop that saw a reflection", input: "number", unit: "1", quantity: "reflection" },
  {
    id: "band",
    label: "Band that is hit",
    input: "choice",
    choices: BANDS.map(({ value, label }) => ({ value, label })),
    quantity: "band",
  },
  { id: "presence", label: "How often it was heard", input: "choice", choices: PRESENCE_CHOICES, quantity: "presence" },
  { id: "action", label: "What you do there", input: "choice", choices: ACTION_CHOICES, quantity: "action" },
];
