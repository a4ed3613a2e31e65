import type { HorizonSector } from "@/lib/gnss/siting/skyMask";
import type { Random } from "@/lib/numeric/random";
import { guessAnswers } from "../guessAnswers";
import type { Answers, BuiltCase, Difficulty, PublicCase, Trial } from "../kind";
import { buildCase } from "./buildCase";
import type { SkyViewTruth } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { SkyViewParameters } from "./parameters";
import { givenIn } from "./publicCase";
import { POSITIONS } from "./quantities";
import { choiceOf, survey, type Place } from "./survey";
import { answersFor } from "./solve";

export const trial: Trial<SkyViewParameters, SkyViewTruth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read: ({ publicCase }, _plan, random) => read(publicCase, random),
  guess: ({ sections }, _plan, random) => guessAnswers(sections, GUESSES, random),
  difficulty,
};

const TOP_SIGMA_DEG = 0.5; // of a reading on the plot instead of the table
const PLACE_SIGMA_M = 0.1;
const SLIP_SIGMA_PERCENT = 0.2; // of adding up twenty rounded terms

/** Tops read off the plot, places off the plan, terms rounded; one person in two writes whole per cents and half metres. */
function read(publicCase: PublicCase, random: Random): Answers {
  const { roof, rules } = givenIn(publicCase);
  const off = <P extends Place>(place: P): P => ({
    ...place,
    eastM: place.eastM + PLACE_SIGMA_M * random.gaussian(),
    northM: place.northM + PLACE_SIGMA_M * random.gaussian(),
  });
  const seen = (sector: HorizonSector) => ({
    ...sector,
    topDeg: Math.min(90, Math.max(0, sector.topDeg + TOP_SIGMA_DEG * random.gaussian())),
  });
  const positions = roof.positions.map((position) => ({ ...off(position), horizon: position.horizon.map(seen) }));
  const coarse = random.uniform() < 0.5;
  const written = (value: number, step: number) => Math.round(value / step) * step;
  const surveyed = survey({ ...roof, positions }, rules).map((one) => ({
    ...one,
    blockedPercent: written(one.blockedPercent + SLIP_SIGMA_PERCENT * random.gaussian(), coarse ? 1 : 0.1),
    quadrantsPercent: one.quadrantsPercent.map((share) => written(share, coarse ? 0.5 : 0.1)),
    roomM: written(one.roomM, coarse ? 0.5 : 0.1),
  }));
  return answersFor(surveyed, choiceOf(surveyed));
}

const GUESSES = Object.fromEntries(
  POSITIONS.flatMap((id) => [
    [`${id}.blocked`, [5, 40]],
    [`${id}.quadrantBlocked`, [4, 20]],
    [`${id}.room`, [-4, 8]],
  ]),
) as Record<string, readonly [number, number]>;

function difficulty({ truth }: BuiltCase<SkyViewTruth>): Difficulty[] {
  const { surveyed, rules, roof } = truth;
  const toLimit = surveyed.flatMap(({ blockedPercent, quadrantsPercent, worst }) => [
    Math.abs(blockedPercent - rules.totalPercent),
    Math.abs(quadrantsPercent[worst] - rules.quadrantPercent),
  ]);
  const pieces = roof.positions.reduce((sum, { horizon }) => sum + horizon.length, 0);
  return [
    { label: "Least distance from a limit of the sky", unit: "%", value: Math.min(...toLimit), from: 2, to: 9 },
    {
      label: "Least room kept or broken",
      unit: "m",
      value: Math.min(...surveyed.map(({ roomM }) => Math.abs(roomM))),
      from: 1,
      to: 6,
    },
    { label: "Pieces of horizon", unit: "1", value: pieces, from: 12, to: 50 },
  ];
}
