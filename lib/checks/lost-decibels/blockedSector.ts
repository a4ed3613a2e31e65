import { turnDeg, wrapDeg, type Readings } from "@/lib/gnss/sky/receiverLog";
import type { Random } from "@/lib/numeric/random";
import type { SkyPass, SkyTimes } from "../receiver-log/drawSky";
import type { Sector } from "../receiver-log/sector";

/** What stands in the sector reaches so far up; satellites above it are not touched. */
export const BLOCKED_BELOW_DEG = 60;
const CLEAR_OF_TOP_DEG = 5;
const LOWEST_SEEN_DEG = 10;
/** So far to either side of an edge a satellite must have been seen, or nobody could tell where it is. */
const EDGE_SEEN_DEG = 3;
const TRIES = 60;

/** A sector with two edges that can be read from the log, or null when these tracks show none of such a width. */
export function drawSector(
  random: Random,
  sky: readonly SkyPass[],
  times: SkyTimes,
  blocked: Readings,
  [narrowest, widest]: readonly [number, number],
): Sector | null {
  const seen = azimuthsSeen(sky, times, blocked);
  const edges = seen.flatMap((_, azimuthDeg) => (isSeenAround(seen, azimuthDeg) ? [azimuthDeg] : []));
  if (edges.length === 0) return null;
  for (let tries = 0; tries < TRIES; tries++) {
    const fromDeg = random.pick(edges);
    const toDeg = random.pick(edges);
    const width = wrapDeg(toDeg - fromDeg);
    if (width >= narrowest && width <= widest) return { fromDeg, toDeg };
  }
  return null;
}

const isSeenAround = (seen: readonly boolean[], azimuthDeg: number) =>
  Array.from({ length: 2 * EDGE_SEEN_DEG + 1 }, (_, n) => seen[wrapDeg(azimuthDeg + n - EDGE_SEEN_DEG)]).every(Boolean);

/** Whole azimuths that some satellite went through, high enough to be tracked and low enough to be blocked. */
function azimuthsSeen(sky: readonly SkyPass[], { trackEvery }: SkyTimes, [first, last]: Readings): boolean[] {
  const seen = Array.from({ length: 360 }, () => false);
  for (const pass of sky)
    for (let place = 0; place + 1 < pass.azimuthDeg.length; place++) {
      const reading = pass.first + place * trackEvery;
      const elevations = [pass.elevationDeg[place], pass.elevationDeg[place + 1]];
      if (reading < first || reading + trackEvery > last) continue;
      if (elevations.some((one) => one < LOWEST_SEEN_DEG || one > BLOCKED_BELOW_DEG - CLEAR_OF_TOP_DEG)) continue;
      const turn = turnDeg(pass.azimuthDeg[place], pass.azimuthDeg[place + 1]);
      for (let step = 0; step <= Math.abs(turn); step++)
        seen[Math.floor(wrapDeg(pass.azimuthDeg[place] + Math.sign(turn) * step))] = true;
    }
  return seen;
}
