import type { Random } from "@/lib/numeric/random";
import { distanceM, roomsM, type Emitter, type Place } from "./survey";

const SIZE_M = { east: 30, north: 20 } as const;
const STEP_M = 0.5;
const APART_M = 3;

/** Keep-out distances in m, from and to: common practice, no source; the case states the one that holds. */
const KINDS = [
  ["mobile panel antenna", 6, 9],
  ["radio-link dish", 3, 5],
  ["satellite terminal", 7, 10],
  ["two-way radio whip", 4, 7],
  ["other firm's GNSS antenna", 2, 3],
  ["wireless network antenna", 2, 4],
] as const;

/** Emitters of a roof, each kind once, apart from each other. */
export function drawEmitters(random: Random): Emitter[] {
  const emitters: Emitter[] = [];
  for (const [name, from, to] of random.shuffle(KINDS).slice(0, random.integer(3, 4))) {
    const keepOutM = random.integer(from / STEP_M, to / STEP_M) * STEP_M;
    emitters.push({ name, ...placeApart(emitters, random), keepOutM });
  }
  return emitters;
}

/** A place on the roof, clear of all others. */
export function placeApart(others: readonly Place[], random: Random): Place {
  for (let tries = 0; tries < 200; tries++) {
    const place = drawPlace(random);
    if (others.every((other) => distanceM(place, other) >= APART_M)) return place;
  }
  throw new Error("sky-view: no place is left on the roof");
}

/** A place whose room to the tightest emitter lies between two values; null when none is found. */
export function placeWithRoom(
  emitters: readonly Emitter[],
  others: readonly Place[],
  [leastM, mostM]: readonly [number, number],
  random: Random,
): Place | null {
  for (let tries = 0; tries < 200; tries++) {
    const place = drawPlace(random);
    const { roomM } = roomsM(place, emitters)[0];
    const clear = [...others, ...emitters].every((other) => distanceM(place, other) >= 1);
    if (clear && roomM >= leastM && roomM <= mostM) return place;
  }
  return null;
}

const drawPlace = (random: Random): Place => ({
  eastM: random.integer(0, SIZE_M.east / STEP_M) * STEP_M,
  northM: random.integer(0, SIZE_M.north / STEP_M) * STEP_M,
});
