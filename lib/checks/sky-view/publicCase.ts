import { askedQuantities } from "../askedQuantities";
import { formatUnderstood } from "../formatUnderstood";
import type { CaseFile, CheckPlan, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import type { SkyViewTruth } from "./drawCase";
import type { SkyViewParameters } from "./parameters";
import { pointsText } from "./pointsText";
import { CHOICES, POSITIONS, QUADRANTS, skyViewCautions, skyViewQuantities } from "./quantities";
import type { Roof, Rules } from "./survey";

/** Field by field: roof, horizons and limits, and nothing of what a survey finds. */
export function publicCase({ roof, rules }: SkyViewTruth, plan: CheckPlan<SkyViewParameters>): PublicCase {
  const asked = askedQuantities(skyViewQuantities, plan);
  const points = ({ tolerance }: { tolerance: number }) => pointsText(tolerance);
  const sections = [
    ...POSITIONS.map((id) => ({ id, title: `Position ${id}`, fields: POSITION_FIELDS })),
    { id: "verdict", title: "Your choice", fields: VERDICT_FIELDS },
  ];
  return {
    kind: "sky-view",
    version: 1,
    title: plan.title,
    brief: briefOf(rules),
    given: [
      { label: "Sky that counts", value: `above ${degrees(rules.maskDeg)}` },
      { label: "Blocked in all", value: `at most ${formatUnderstood(rules.totalPercent, "%")}` },
      { label: "Blocked in one quadrant", value: `at most ${formatUnderstood(rules.quadrantPercent, "%")}` },
      { label: "Distance to each emitter", value: "at least its keep-out distance" },
    ],
    cautions: [...skyViewCautions],
    sections: sections
      .map((section) => ({ ...section, fields: section.fields.filter(({ quantity }) => asked.has(quantity)) }))
      .filter(({ fields }) => fields.length > 0),
    tolerances: publicTolerances(asked, { blocked: points, quadrantBlocked: points }),
    data: {
      maskDeg: rules.maskDeg,
      totalPercent: rules.totalPercent,
      quadrantPercent: rules.quadrantPercent,
      hatch: { eastM: roof.hatch.eastM, northM: roof.hatch.northM },
      emitters: roof.emitters.map(({ name, eastM, northM, keepOutM }) => ({ name, eastM, northM, keepOutM })),
      positions: roof.positions.map(({ id, eastM, northM, horizon }) => ({
        id,
        eastM,
        northM,
        horizon: horizon.map(({ fromDeg, toDeg, topDeg }) => ({ fromDeg, toDeg, topDeg })),
      })),
      horizonFile: HORIZON_FILE,
    },
  };
}

/** What the public case says, as the survey takes it. */
export function givenIn({ data }: PublicCase): { roof: Roof; rules: Rules } {
  const { hatch, emitters, positions, maskDeg, totalPercent, quadrantPercent } = data as Roof & Rules;
  return { roof: { hatch, emitters, positions }, rules: { maskDeg, totalPercent, quadrantPercent } };
}

const HORIZON_FILE = "horizons.csv";

/** The same pieces as on the screen, for a spreadsheet. */
export function horizonFile({ roof }: SkyViewTruth): CaseFile {
  const lines = roof.positions.flatMap(({ id, horizon }) =>
    horizon.map(({ fromDeg, toDeg, topDeg }) => `${id},${fromDeg},${toDeg},${topDeg}`),
  );
  const text = ["position,from_azimuth_deg,to_azimuth_deg,top_elevation_deg", ...lines, ""].join("\r\n");
  return { name: HORIZON_FILE, mediaType: "text/csv", bytes: new TextEncoder().encode(text) };
}

const degrees = (value: number) => `${formatUnderstood(value, "1")}°`;

const briefOf = ({ maskDeg }: Rules) => [
  "Three positions for one antenna were surveyed on a roof. Each has its horizon: from azimuth to azimuth nothing is seen below the top elevation.",
  `A share of the sky is a share of its solid angle above ${degrees(maskDeg)}. All shares here are of the whole sky above ${degrees(maskDeg)}, those of one quadrant too, so the four quadrants add up to the share in all.`,
  "The room to an emitter is the distance on the plan less the emitter's keep-out distance; it is below zero where the position stands too near. State it for the emitter where it is least.",
  "A position will do when both limits of the sky and all keep-out distances are kept. Of those that will do, choose the one with least sky blocked.",
];

const POSITION_FIELDS: readonly FieldSpec[] = [
  { id: "blocked", label: "Sky blocked in all", input: "number", unit: "%", quantity: "blocked" },
  { id: "quadrant", label: "Worst quadrant", input: "choice", choices: QUADRANTS, quantity: "quadrant" },
  {
    id: "quadrantBlocked",
    label: "Sky blocked in it",
    input: "number",
    unit: "%",
    help: "Of the whole sky.",
    quantity: "quadrantBlocked",
  },
  { id: "room", label: "Room to the tightest emitter", input: "number", unit: "m", signed: true, quantity: "room" },
];

const VERDICT_FIELDS: readonly FieldSpec[] = [
  { id: "choice", label: "Position to choose", input: "choice", choices: CHOICES, quantity: "choice" },
];
