import { blockedShare, zoneShare, type HorizonSector } from "@/lib/gnss/siting/skyMask";
import { NONE, type PositionId } from "./quantities";

export type Place = { eastM: number; northM: number };
export type Position = Place & { id: PositionId; horizon: HorizonSector[] };
/** What must keep its distance from the antenna, whatever its kind. */
export type Emitter = Place & { name: string; keepOutM: number };
export type Roof = { hatch: Place; emitters: Emitter[]; positions: Position[] };
export type Rules = { maskDeg: number; totalPercent: number; quadrantPercent: number };

/** Shares of the whole sky that a horizon hides. */
export type Sky = {
  blockedPercent: number;
  /** In order of azimuth. */
  quadrantsPercent: number[];
  /** Index of the worst quadrant. */
  worst: number;
};

/** What a survey writes down of one position. */
export type Surveyed = Sky & {
  id: PositionId;
  /** Distance less keep-out distance, to the emitter where that is least; below 0 the position is too near. */
  roomM: number;
  tightest: string;
  fits: boolean;
};

/**
 * The right method on given figures.
 * @param zone measure of a piece's hidden sky, the solid angle's unless a wrong one is to be tried
 */
export const survey = (roof: Roof, rules: Rules, zone: typeof zoneShare = zoneShare): Surveyed[] =>
  roof.positions.map((position) => {
    const sky = skyOver(position.horizon, rules.maskDeg, zone);
    const { roomM, name: tightest } = roomsM(position, roof.emitters)[0];
    return { id: position.id, ...sky, roomM, tightest, fits: keepsLimits(sky, rules) && roomM >= 0 };
  });

export function skyOver(horizon: readonly HorizonSector[], maskDeg: number, zone: typeof zoneShare = zoneShare): Sky {
  const percent = (from: number, to: number) => 100 * blockedShare(horizon, maskDeg, [from, to], zone);
  const quadrantsPercent = [0, 90, 180, 270].map((from) => percent(from, from + 90));
  const worst = quadrantsPercent.indexOf(Math.max(...quadrantsPercent));
  return { blockedPercent: percent(0, 360), quadrantsPercent, worst };
}

export const keepsLimits = ({ blockedPercent, quadrantsPercent, worst }: Sky, rules: Rules): boolean =>
  blockedPercent <= rules.totalPercent && quadrantsPercent[worst] <= rules.quadrantPercent;

/** Room to each emitter, the tightest first. */
export const roomsM = (place: Place, emitters: readonly Emitter[]) =>
  emitters
    .map(({ name, keepOutM, ...at }) => ({
      name,
      distanceM: distanceM(place, at),
      roomM: distanceM(place, at) - keepOutM,
    }))
    .sort((a, b) => a.roomM - b.roomM);

/** On the plan. */
export function distanceM(a: Place, b: Place): number {
  const [east, north] = [a.eastM - b.eastM, a.northM - b.northM];
  return Math.sqrt(east * east + north * north);
}

/** Of the positions that fit, the one with least sky blocked. */
export function choiceOf(surveyed: readonly Surveyed[]): PositionId | typeof NONE {
  const fit = surveyed.filter(({ fits }) => fits).sort((a, b) => a.blockedPercent - b.blockedPercent);
  return fit.length > 0 ? fit[0].id : NONE;
}
