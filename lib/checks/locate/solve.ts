import { errorEllipse, type Ellipse } from "@/lib/gnss/interference/bearingFix";
import type { Answers, PublicCase } from "../kind";
import { BANDS } from "./bands";
import { PROBABILITY } from "./drawCase";
import { findReflection } from "./findReflection";
import type { LogRow } from "./patrolLog";

/** What somebody found, before it is written down. */
export type Findings = { ellipse: Ellipse; reflectionStop: number };

/** The right method, from the public case alone: take out the reflection, weighted least squares, ellipse. */
export function solve(publicCase: PublicCase): Answers {
  return answersFor(publicCase, findingsOf(publicCase));
}

export const logOf = ({ data }: PublicCase): LogRow[] => data.log as LogRow[];

export function findingsOf(publicCase: PublicCase): Findings {
  const { stop, fix } = findReflection(logOf(publicCase));
  return { ellipse: errorEllipse(fix, PROBABILITY), reflectionStop: stop };
}

/** The whole form as a careful person fills it in. */
export function answersFor(publicCase: PublicCase, { ellipse, reflectionStop }: Findings): Answers {
  const frequencyMhz = publicCase.data.frequencyMhz as number;
  const band = BANDS.find(({ fromMhz, toMhz }) => frequencyMhz >= fromMhz && frequencyMhz <= toMhz);
  const isAlwaysOn = logOf(publicCase).every(({ bearingDeg }) => bearingDeg !== null);
  return {
    "fix.east": ellipse.eastM.toFixed(0),
    "fix.north": ellipse.northM.toFixed(0),
    "fix.major": ellipse.semiMajorM.toFixed(0),
    "fix.minor": ellipse.semiMinorM.toFixed(0),
    "fix.azimuth": ellipse.azimuthDeg.toFixed(0),
    "report.reflection": String(reflectionStop),
    "report.band": band?.value ?? "none",
    "report.presence": isAlwaysOn ? "always" : "times",
    "report.action": "report",
  };
}
