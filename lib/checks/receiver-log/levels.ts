import { elevationAt, type Pass } from "@/lib/gnss/sky/receiverLog";
import { sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { lengthOf, type SkyPass, type SkyTimes } from "./drawSky";

/** How C/N0 goes with elevation at a station; common practice, no source. */
export type Pattern = {
  zenithDbHz: number;
  /** What the horizon has less than the zenith. */
  fallDb: number;
};

const SATELLITE_SPREAD_DB = 0.6; // either way, from satellite to satellite
const GROUND_WAVE_DB = 0.5; // of the ripple that a reflection leaves at the horizon
const READING_NOISE_DB = 0.5;
/** Weaker satellites are not tracked, and their C/N0 stays empty. */
export const LOWEST_TRACKED_DBHZ = 25;

export const drawPattern = (random: Random): Pattern => ({
  zenithDbHz: between(random, 46, 53),
  fallDb: between(random, 9, 17),
});

/** Share of the fall at an elevation: 0 at the zenith, 1 at the horizon. */
const lowness = (elevationDeg: number) => {
  const down = 1 - sinTurns(elevationDeg / 360);
  return down * down;
};

export const patternDbHz = ({ zenithDbHz, fallDb }: Pattern, elevationDeg: number): number =>
  zenithDbHz - fallDb * lowness(elevationDeg);

/** What a fault takes from a satellite at this reading, dB; negative where it adds. */
export type Loss = (reading: number, pass: SkyPass) => number;

/** C/N0 as a receiver logs it: pattern, satellite, ripple of the ground, fault, noise; whole dB-Hz. */
export function drawReadings(
  random: Random,
  sky: readonly SkyPass[],
  times: SkyTimes,
  pattern: Pattern,
  lossDb: Loss,
): Pass[] {
  return sky.map((pass) => {
    const own = between(random, -SATELLITE_SPREAD_DB, SATELLITE_SPREAD_DB);
    const rippleTurns = times.intervalS / between(random, 600, 2400);
    const rippleStart = random.uniform();
    const cn0DbHz = Array.from({ length: lengthOf(pass, times) }, (_, at) => {
      const reading = pass.first + at;
      const low = lowness(elevationAt(pass, times.trackEvery, reading));
      const ripple = GROUND_WAVE_DB * low * sinTurns(rippleStart + at * rippleTurns);
      const level = pattern.zenithDbHz - pattern.fallDb * low + own + ripple - lossDb(reading, pass);
      const read = Math.round(level + READING_NOISE_DB * random.gaussian());
      return read >= LOWEST_TRACKED_DBHZ ? read : null;
    });
    return { ...pass, cn0DbHz };
  });
}
