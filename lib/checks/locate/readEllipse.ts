import type { Ellipse } from "@/lib/gnss/interference/bearingFix";
import type { Unit } from "@/lib/gnss/units";
import { answerOf, isBlank } from "../answerOf";
import { formatQuantity } from "../formatQuantity";
import type { Answers } from "../kind";
import { parseQuantity } from "../parseQuantity";

export type ReadEllipse = { typed: string; ellipse: Ellipse | null; problem: string };

type Bounds = { id: string; label: string; unit: Unit; from: number; to: number };

const FIELDS: readonly Bounds[] = [
  { id: "east", label: "East", unit: "m", from: -1e6, to: 1e7 },
  { id: "north", label: "North", unit: "m", from: -1e6, to: 1e7 },
  { id: "major", label: "Long half axis", unit: "m", from: 0.1, to: 1e5 },
  { id: "minor", label: "Short half axis", unit: "m", from: 0.1, to: 1e5 },
  { id: "azimuth", label: "Direction", unit: "deg", from: -360, to: 360 },
];

/** The ellipse as handed in, or the first field that keeps it from being drawn. */
export function readEllipse(answers: Answers): ReadEllipse {
  const texts = FIELDS.map(({ id }) => answerOf(answers, `fix.${id}`));
  const typed = texts.every(isBlank) ? "" : texts.map((text) => text.trim() || "–").join("; ");
  const values: number[] = [];
  for (const [n, { label, unit, from, to }] of FIELDS.entries()) {
    const reading = parseQuantity(texts[n], unit);
    const problem =
      "problem" in reading
        ? reading.problem
        : reading.value >= from && reading.value <= to
          ? null
          : `from ${formatQuantity(from, unit, 1)} to ${formatQuantity(to, unit, 0)} can be drawn.`;
    if (problem) return { typed, ellipse: null, problem: typed === "" ? problem : `${label}: ${problem}` };
    values.push((reading as { value: number }).value);
  }
  const [eastM, northM, semiMajorM, semiMinorM, azimuthDeg] = values;
  return { typed, ellipse: { eastM, northM, semiMajorM, semiMinorM, azimuthDeg }, problem: "" };
}
