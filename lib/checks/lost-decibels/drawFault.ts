import { directionAt, type Readings } from "@/lib/gnss/sky/receiverLog";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { lengthOf, type SkyPass, type SkyTimes } from "../receiver-log/drawSky";
import { LOWEST_TRACKED_DBHZ, patternDbHz, type Loss, type Pattern } from "../receiver-log/levels";
import { isInSector, type Sector } from "../receiver-log/sector";
import { BLOCKED_BELOW_DEG, drawSector } from "./blockedSector";
import type { LostDecibelsParameters } from "./parameters";
import type { Cause } from "./quantities";

export type Fault = {
  /** First and last reading that it touches. */
  readings: Readings;
  /** Grows from nothing at the first reading to the whole at the last. */
  slow: boolean;
  depthDb: number;
  /** Change of the receiver's own gain, of the current of the antenna feed. */
  gainDb: number;
  currentMa: number;
  sector: Sector | null;
};

/** Gain control and C/N0 do not change by the same, or the one would be read for the other and nobody would see it. */
const LEAST_APART_DB = 1.6;

/** What a fault of this cause does to the log; null when these tracks cannot show it. */
export function drawFault(
  random: Random,
  cause: Exclude<Cause, "nothing">,
  sky: readonly SkyPass[],
  times: SkyTimes,
  pattern: Pattern,
  parameters: LostDecibelsParameters,
): Fault | null {
  const depthDb = Math.round(10 * between(random, ...parameters.depth)) / 10;
  const apartDb = between(random, LEAST_APART_DB, 4);
  switch (cause) {
    case "interference": {
      // Power beside the signals turns the gain down and costs no C/N0; a pulsed or matched one costs more than it turns.
      const less = depthDb - apartDb >= LEAST_APART_DB && random.uniform() < 0.5;
      const gainDb = -(less ? depthDb - apartDb : depthDb + apartDb);
      return { readings: drawSpan(random, times, 0.2), slow: false, depthDb, gainDb, currentMa: 0, sector: null };
    }
    case "loss": {
      const gainDb = depthDb + apartDb;
      // An amplifier that fails takes less current, one with a short in it more.
      const currentMa = random.uniform() < 0.6 ? -between(random, 8, 18) : between(random, 8, 25);
      return { readings: drawSpan(random, times, 0.5), slow: false, depthDb, gainDb, currentMa, sector: null };
    }
    case "water": {
      const first = Math.round(between(random, 0.2, 0.5) * times.readings);
      const gainDb = depthDb + apartDb + 1; // its last readings are a little short of the whole
      const currentMa = between(random, 2.5, 7); // leaks through the wet joint
      return { readings: [first, times.readings - 1], slow: true, depthDb, gainDb, currentMa, sector: null };
    }
    case "blockage": {
      const readings = drawSpan(random, times, 0.5);
      const sector = drawSector(random, sky, times, readings, parameters.sector);
      if (!sector || !isSeen(sector, readings, depthDb, sky, times, pattern)) return null;
      return { readings, slow: false, depthDb, gainDb: 0, currentMa: 0, sector };
    }
  }
}

/** From somewhere in the first half; to the end of the log with that probability. */
function drawSpan(random: Random, { readings }: SkyTimes, toTheEnd: number): Readings {
  const first = Math.round(between(random, 0.15, 0.5) * readings);
  const lasts = random.uniform() < toTheEnd;
  const last = first + Math.round(between(random, 0.2, 0.4) * readings);
  return [first, lasts ? readings - 1 : last];
}

const CLEAR_OF_EDGE_DEG = 3;
const CLEAR_OF_TRACKING_DB = 3;

/**
 * At its first reading and at its last a satellite that stays tracked is well inside, and outside before or after: its fall
 * and its return are the times. What lasts to the end of the log is then still seen on a satellite that was clear once.
 */
function isSeen(
  sector: Sector,
  [first, last]: Readings,
  depthDb: number,
  sky: readonly SkyPass[],
  times: SkyTimes,
  pattern: Pattern,
): boolean {
  const inner = { fromDeg: sector.fromDeg + CLEAR_OF_EDGE_DEG, toDeg: sector.toDeg - CLEAR_OF_EDGE_DEG };
  const isInside = (pass: SkyPass, reading: number) => {
    const { azimuthDeg, elevationDeg } = directionAt(pass, times.trackEvery, reading);
    const leftDbHz = patternDbHz(pattern, elevationDeg) - depthDb;
    return (
      isInSector(inner, azimuthDeg) &&
      elevationDeg < BLOCKED_BELOW_DEG - CLEAR_OF_EDGE_DEG &&
      leftDbHz >= LOWEST_TRACKED_DBHZ + CLEAR_OF_TRACKING_DB
    );
  };
  const isOutside = (pass: SkyPass, reading: number) =>
    !isInSector(sector, directionAt(pass, times.trackEvery, reading).azimuthDeg);
  const passesAt = (reading: number) =>
    sky.filter((pass) => reading >= pass.first && reading < pass.first + lengthOf(pass, times));
  const steps = (pass: SkyPass, reading: number) =>
    reading - pass.first >= STEP_SEEN && pass.first + lengthOf(pass, times) - reading > STEP_SEEN;
  const falls = passesAt(first).some((pass) => steps(pass, first) && isInside(pass, first));
  const lasts = last === times.readings - 1;
  return (
    falls &&
    passesAt(last).some(
      (pass) => isInside(pass, last) && (lasts ? isOutside(pass, pass.first + STEP_SEEN) : steps(pass, last)),
    )
  );
}

/** Readings on either side that a step is seen in. */
const STEP_SEEN = 20;

/** Share of a fault at a reading: all or nothing, or growing. */
export function shareAt({ readings: [first, last], slow }: Fault, reading: number): number {
  if (reading < first || reading > last) return 0;
  return slow ? (reading - first) / (last - first) : 1;
}

/** What the fault takes from a satellite. */
export const lossOf =
  (fault: Fault | null, { trackEvery }: SkyTimes): Loss =>
  (reading, pass) => {
    const share = fault ? shareAt(fault, reading) : 0;
    if (!fault || share === 0) return 0;
    if (!fault.sector) return fault.depthDb * share;
    const { azimuthDeg, elevationDeg } = directionAt(pass, trackEvery, reading);
    return elevationDeg < BLOCKED_BELOW_DEG && isInSector(fault.sector, azimuthDeg) ? fault.depthDb : 0;
  };
