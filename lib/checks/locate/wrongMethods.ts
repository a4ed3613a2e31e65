import { errorEllipse } from "@/lib/gnss/interference/bearingFix";
import type { WrongMethod } from "../kind";
import { PROBABILITY, type LocateTruth } from "./drawCase";
import { fixWith } from "./findReflection";
import type { LocateParameters } from "./parameters";
import { placeByLevel } from "./placeByLevel";
import { answersFor, findingsOf, logOf, solve } from "./solve";

type Wrong = WrongMethod<LocateParameters, LocateTruth>;

const ONE_SIGMA_OF_AXES = 1 / 2.4477; // sqrt(-2 ln 0.05), the 95 % ellipse's scale

/** Typical wrong ways; each works with care but for the named step. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "reflection-averaged": {
    label: "The reflection averaged in with the other bearings",
    misses: ["position", "reflection"],
    solve({ publicCase }) {
      const all = fixWith(logOf(publicCase));
      const right = findingsOf(publicCase);
      const ellipse = all ? errorEllipse(all, PROBABILITY) : right.ellipse; // a case without such a fix is never drawn
      return { ...answersFor(publicCase, { ...right, ellipse }), "report.reflection": "" };
    },
  },
  "level-as-distance": {
    label: "The strongest level turned into a distance on its bearing",
    misses: ["position"],
    solve({ publicCase }) {
      const found = findingsOf(publicCase);
      return answersFor(publicCase, { ...found, ellipse: { ...found.ellipse, ...placeByLevel(logOf(publicCase)) } });
    },
  },
  "one-sigma": {
    label: "The ellipse of one standard deviation given as that of 95 %",
    misses: ["position"],
    solve({ publicCase }) {
      const { ellipse, reflectionStop } = findingsOf(publicCase);
      const semiMajorM = ellipse.semiMajorM * ONE_SIGMA_OF_AXES;
      const semiMinorM = ellipse.semiMinorM * ONE_SIGMA_OF_AXES;
      return answersFor(publicCase, { ellipse: { ...ellipse, semiMajorM, semiMinorM }, reflectionStop });
    },
  },
  "device-operated": {
    label: "The device found and switched off",
    misses: ["action"],
    solve: ({ publicCase }) => ({ ...solve(publicCase), "report.action": "switch-off" }),
  },
};
