import type { Place } from "@/lib/gnss/interference/bearingFix";
import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import type { LocateParameters } from "./parameters";

/** Side of the square that the transmitter stands in, from the grid's own corner; a place outside is no answer to guess at. */
export const AREA_M = 2000;
const MARGIN_M = 300;
const DISTANCE_M = { nearest: 200, farthest: 900 } as const;
const APART_M = 60;
const GRID_M = 5;
const WIDEST_SECTOR = { from: 0.35, to: 0.8 } as const; // of a turn: a patrol rarely gets right round

/** Transmitter, the stops that heard it, and those that did not; no two stops at one place. */
export function drawPlaces(
  { stops }: LocateParameters,
  isOffAtTimes: boolean,
  random: Random,
): { transmitter: Place; stops: Place[]; silent: Place[] } {
  const transmitter = {
    eastM: random.integer(10 * MARGIN_M, 10 * (AREA_M - MARGIN_M)) / 10,
    northM: random.integer(10 * MARGIN_M, 10 * (AREA_M - MARGIN_M)) / 10,
  };
  const silentCount = isOffAtTimes ? random.integer(2, 3) : 0;
  const count = random.integer(...stops) + silentCount;
  const from = random.uniform();
  const sector = between(random, WIDEST_SECTOR.from, WIDEST_SECTOR.to);
  const places: Place[] = [];
  while (places.length < count) {
    const turns = from + sector * random.uniform();
    const distanceM = between(random, DISTANCE_M.nearest, DISTANCE_M.farthest);
    const place = {
      eastM: onGrid(transmitter.eastM + distanceM * sinTurns(turns)),
      northM: onGrid(transmitter.northM + distanceM * cosTurns(turns)),
    };
    if (places.every((other) => apart(other, place) >= APART_M)) places.push(place);
  }
  return { transmitter, stops: places.slice(silentCount), silent: places.slice(0, silentCount) };
}

const onGrid = (m: number) => Math.round(m / GRID_M) * GRID_M;

const apart = (a: Place, b: Place) => Math.max(Math.abs(a.eastM - b.eastM), Math.abs(a.northM - b.northM));
