import { ellipseAreaM2, reachInEllipse, type Ellipse } from "@/lib/gnss/interference/bearingFix";
import { cos, PI, sin } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { guessAnswers } from "../guessAnswers";
import type { Trial } from "../kind";
import { buildCase } from "./buildCase";
import type { LocateTruth } from "./drawCase";
import { AREA_M } from "./drawPlaces";
import { markAnswers } from "./markAnswers";
import type { LocateParameters } from "./parameters";
import { answersFor, findingsOf } from "./solve";

/** How the release check tries the kind. */
export const trial: Trial<LocateParameters, LocateTruth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read({ publicCase }, _plan, random) {
    const { ellipse, reflectionStop } = findingsOf(publicCase);
    return answersFor(publicCase, { ellipse: byEye(ellipse, random), reflectionStop });
  },
  guess: ({ sections, data }, _plan, random) =>
    guessAnswers(
      sections,
      {
        "fix.east": [0, AREA_M],
        "fix.north": [0, AREA_M],
        "fix.major": [30, 150],
        "fix.minor": [15, 80],
        "fix.azimuth": [0, 180],
        "report.reflection": () => String(random.integer(1, (data.log as unknown[]).length)),
      },
      random,
    ),
  difficulty: ({ truth }) => [
    { label: "Long half axis of the ellipse", unit: "m", value: truth.ellipse.semiMajorM, from: 8, to: 250 },
    {
      label: "Radius of a circle of its area",
      unit: "m",
      value: Math.sqrt(ellipseAreaM2(truth.ellipse) / PI),
      from: 8,
      to: 200,
    },
    {
      label: "Transmitter in the ellipse, 1 on its edge",
      unit: "1",
      value: reachInEllipse(truth.ellipse, truth.transmitter),
      from: 0.4,
      to: 0.85,
    },
  ],
};

/** Read off a plan with a cursor: middle and axes off by a few per cent of the axes, whole or five metres. */
function byEye(ellipse: Ellipse, random: Random): Ellipse {
  const turn = (ellipse.azimuthDeg * PI) / 180;
  const along = 0.05 * random.gaussian() * ellipse.semiMajorM;
  const across = 0.05 * random.gaussian() * ellipse.semiMinorM;
  const step = ellipse.semiMinorM < 50 ? 1 : 5;
  const rounded = (m: number) => Math.round(m / step) * step;
  return {
    eastM: rounded(ellipse.eastM + along * sin(turn) + across * cos(turn)),
    northM: rounded(ellipse.northM + along * cos(turn) - across * sin(turn)),
    semiMajorM: rounded(ellipse.semiMajorM * (1 + 0.05 * random.gaussian())),
    semiMinorM: rounded(ellipse.semiMinorM * (1 + 0.05 * random.gaussian())),
    azimuthDeg: ellipse.azimuthDeg + 3 * random.gaussian(),
  };
}
