import type { HorizonSector } from "@/lib/gnss/siting/skyMask";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { drawHorizon, type Surroundings } from "./drawHorizon";
import { drawEmitters, placeApart, placeWithRoom } from "./drawRoof";
import { isClear, isFair } from "./isFair";
import type { SkyViewParameters } from "./parameters";
import { NONE, POSITIONS, type PositionId } from "./quantities";
import {
  choiceOf,
  keepsLimits,
  skyOver,
  survey,
  type Position,
  type Roof,
  type Rules,
  type Sky,
  type Surveyed,
} from "./survey";

export type SkyViewTruth = { roof: Roof; rules: Rules; surveyed: Surveyed[]; choice: PositionId | typeof NONE };
export type DrawnCase = { truth: SkyViewTruth; draws: number };

/** What a position is there for: to be chosen, to have too little sky in all or on one side, or to stand too near. */
type Role = "fit" | "walled" | "sided" | "near";

const SURROUNDINGS: Readonly<Record<Role, Surroundings>> = {
  fit: { obstacles: [3, 6], width: [5, 16], topDeg: [13, 34] },
  walled: { obstacles: [4, 8], width: [8, 20], topDeg: [18, 42] },
  sided: { obstacles: [1, 2], width: [13, 18], topDeg: [35, 62], oneSide: true },
  near: { obstacles: [2, 4], width: [4, 10], topDeg: [11, 24] },
};
/** What makes a horizon suit its role. */
const SUITS: Readonly<Record<Role, (sky: Sky, rules: Rules) => boolean>> = {
  fit: (sky, rules) => keepsLimits(sky, rules) && sky.blockedPercent >= LEAST_OF_FIT,
  walled: (sky, rules) => sky.blockedPercent > rules.totalPercent,
  sided: (sky, rules) => !keepsLimits(sky, rules) && sky.blockedPercent <= rules.totalPercent,
  near: keepsLimits,
};
const LEAST_OF_FIT = 6; // so that the position that stands too near can look better
const ROOM_M = { clear: [1, 8], near: [-6, -1] } as const;

/** Three positions on a roof: one that fits, two of them, or none; the roomiest sky always stands too near an emitter. */
export function drawCase(seedHex: string, parameters: SkyViewParameters): DrawnCase {
  const first = seededRandom(seedHex, "sky-view@1/case");
  const noneFits = first.uniform() * 100 < parameters.noneFit; // before the draws, so that refusing does not move the share
  const rules = {
    maskDeg: parameters.mask,
    totalPercent: parameters.total,
    quadrantPercent: parameters.quadrant,
  };
  for (let draws = 1; draws <= 500; draws++) {
    const random = seededRandom(seedHex, `sky-view@1/draw-${draws}`);
    const roof = drawRoof(rolesOf(noneFits, random), rules, random);
    if (!roof) continue;
    const surveyed = survey(roof, rules);
    const choice = choiceOf(surveyed);
    if ((choice === NONE) === noneFits && isFair(roof, rules, surveyed))
      return { truth: { roof, rules, surveyed, choice }, draws };
  }
  throw new Error("sky-view: no fair roof in 500 draws");
}

function rolesOf(noneFits: boolean, random: Random): Role[] {
  const other = random.pick(["walled", "sided"] as const);
  if (noneFits) return ["near", "walled", "sided"];
  return ["near", "fit", random.uniform() < 0.35 ? "fit" : other];
}

function drawRoof(roles: readonly Role[], rules: Rules, random: Random): Roof | null {
  const emitters = drawEmitters(random);
  const hatch = placeApart(emitters, random);
  const positions: Position[] = [];
  for (const [n, role] of random.shuffle(roles).entries()) {
    const room = role === "near" ? ROOM_M.near : ROOM_M.clear;
    const place = placeWithRoom(emitters, [hatch, ...positions], room, random);
    const horizon = suitingHorizon(role, rules, random);
    if (!place || !horizon) return null;
    positions.push({ id: POSITIONS[n], ...place, horizon });
  }
  return { hatch, emitters, positions };
}

function suitingHorizon(role: Role, rules: Rules, random: Random): HorizonSector[] | null {
  for (let tries = 0; tries < 100; tries++) {
    const horizon = drawHorizon(SURROUNDINGS[role], random);
    const sky = skyOver(horizon, rules.maskDeg);
    if (isClear(sky, rules) && SUITS[role](sky, rules)) return horizon;
  }
  return null;
}
