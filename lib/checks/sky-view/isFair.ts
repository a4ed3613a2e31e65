import {
  choiceOf,
  distanceM,
  keepsLimits,
  roomsM,
  survey,
  type Roof,
  type Rules,
  type Sky,
  type Surveyed,
} from "./survey";
import { degreesShare, planeShare } from "./wrong-shares";

/*
 * In points of the sky and in metres: each is more than the tolerance of the quantity, so that a reading that is within
 * never turns a verdict round, and a wrong method that gets a quantity outside misses it clearly.
 */
const CLEAR_OF_TOTAL = 3;
const CLEAR_OF_QUADRANT = 2;
const WORST_LEADS_BY = 1.5;
const FIT_LEADS_BY = 4.5;
const WRONG_SHARE_OFF_BY = 2.2;
const HATCH_LEADS_BY_M = 1;
const WRONG_ROOM_OFF_BY_M = 0.8;
const MOST_BLOCKED = 45;

/** Whether careful people reach the right answers and no named wrong method does by chance. */
export function isFair(roof: Roof, rules: Rules, surveyed: readonly Surveyed[]): boolean {
  return (
    fitLeads(surveyed) &&
    [planeShare, degreesShare].every((wrong) => misses(surveyed, survey(roof, rules, wrong))) &&
    hatchMisleads(roof, surveyed) &&
    emittersMatter(surveyed, rules) &&
    nearestMisleads(roof)
  );
}

/** Clearly on one side of each limit, with a worst quadrant that stands out. */
export function isClear({ blockedPercent, quadrantsPercent }: Sky, rules: Rules): boolean {
  const [worst, second] = [...quadrantsPercent].sort((a, b) => b - a);
  return (
    blockedPercent <= MOST_BLOCKED &&
    Math.abs(blockedPercent - rules.totalPercent) >= CLEAR_OF_TOTAL &&
    Math.abs(worst - rules.quadrantPercent) >= CLEAR_OF_QUADRANT &&
    worst - second >= WORST_LEADS_BY
  );
}

/** Of two that fit, the better one is better by more than two readings can be off. */
function fitLeads(surveyed: readonly Surveyed[]): boolean {
  const [best, second] = surveyed.flatMap((one) => (one.fits ? [one.blockedPercent] : [])).sort((a, b) => a - b);
  return second === undefined || second - best >= FIT_LEADS_BY;
}

const misses = (right: readonly Surveyed[], wrong: readonly Surveyed[]): boolean =>
  right.some(({ blockedPercent }, n) => Math.abs(blockedPercent - wrong[n].blockedPercent) >= WRONG_SHARE_OFF_BY);

function hatchMisleads({ hatch, positions }: Roof, surveyed: readonly Surveyed[]): boolean {
  const near = positions.map((one) => ({ id: one.id, awayM: distanceM(one, hatch) })).sort((a, b) => a.awayM - b.awayM);
  return near[0].id !== choiceOf(surveyed) && near[1].awayM - near[0].awayM >= HATCH_LEADS_BY_M;
}

/** Somebody who looks at the sky alone takes a position that stands too near. */
function emittersMatter(surveyed: readonly Surveyed[], rules: Rules): boolean {
  const bySky = choiceBySky(surveyed, rules);
  const lead = surveyed.filter(({ id, fits }) => fits && id !== bySky);
  const taken = surveyed.find(({ id }) => id === bySky);
  return taken !== undefined && !taken.fits && lead.every((one) => one.blockedPercent - taken.blockedPercent >= 1);
}

/** The choice of somebody who overlooks the emitters. */
export const choiceBySky = (surveyed: readonly Surveyed[], rules: Rules) =>
  choiceOf(surveyed.map((one) => ({ ...one, fits: keepsLimits(one, rules) })));

/** Somewhere the nearest emitter is not the one with least room. */
const nearestMisleads = ({ positions, emitters }: Roof): boolean =>
  positions.some((position) => {
    const rooms = roomsM(position, emitters);
    return nearestRoomM(rooms) - rooms[0].roomM >= WRONG_ROOM_OFF_BY_M;
  });

export const nearestRoomM = (rooms: ReturnType<typeof roomsM>): number =>
  rooms.reduce((a, b) => (b.distanceM < a.distanceM ? b : a)).roomM;
