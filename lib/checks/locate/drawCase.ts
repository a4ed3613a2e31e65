import {
  bearingDegOf,
  errorEllipse,
  reachInEllipse,
  type Ellipse,
  type Place,
} from "@/lib/gnss/interference/bearingFix";
import { log10 } from "@/lib/numeric/elementary";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { BANDS, drawBand, type Band } from "./bands";
import { placeByLevel } from "./placeByLevel";
import { fixWith, fixWithout, type FoundFix } from "./findReflection";
import { drawPlaces } from "./drawPlaces";
import type { LocateParameters } from "./parameters";
import { heardRows, type HeardRow, type LogRow } from "./patrolLog";

export type LocateTruth = {
  transmitter: Place;
  log: LogRow[];
  frequencyMhz: number;
  band: Band["value"];
  isOffAtTimes: boolean;
  reflectionStop: number;
  /** Weighted least squares without the reflection. */
  best: FoundFix;
  ellipse: Ellipse;
};

export type DrawnCase = { truth: LocateTruth; draws: number };

export const PROBABILITY = 0.95;

/** Place of the truth in the ellipse, 1 on its edge: outside of the 1-sigma one (1/2.448) and clear of the edge. */
const REACH = { from: 0.46, to: 0.8 } as const;
const CLEARLY_OUTSIDE = 1.3;
const TELLING = 15; // of the sum of squares, between the reflection and any other stop taken out
const SEMI_AXES_M = { shortest: 8, longest: 250 } as const;
const LONGEST_TO_SHORTEST = 6;

/** Draws until the reflection can be told and no named wrong method comes to the transmitter by chance. */
export function drawCase(seedHex: string, parameters: LocateParameters): DrawnCase {
  const first = seededRandom(seedHex, "locate@1/case");
  const isOffAtTimes = first.uniform() * 100 < parameters.intermittent; // before the draws, so that refusing does not move the share
  for (let draws = 1; draws <= 1000; draws++) {
    const random = seededRandom(seedHex, `locate@1/draw-${draws}`);
    const truth = drawTruth(parameters, isOffAtTimes, random);
    if (truth && isFair(truth)) return { truth, draws };
  }
  throw new Error("locate: no fair log in 1000 draws");
}

function drawTruth(parameters: LocateParameters, isOffAtTimes: boolean, random: Random): LocateTruth | null {
  const { transmitter, stops, silent } = drawPlaces(parameters, isOffAtTimes, random);
  const band = random.pick(BANDS);
  const frequencyMhz = drawBand(band, random);
  const reflected = random.integer(0, stops.length - 1);
  const levelAtOneMetre = between(random, -45, -15);
  const heard = stops.map((place, n) => hear(place, transmitter, n === reflected, levelAtOneMetre, parameters, random));
  const log = drawLog(heard, silent, random);
  const reflectionStop = log.find(
    ({ eastM, northM }) => eastM === stops[reflected].eastM && northM === stops[reflected].northM,
  )!.stop;
  const best = fixWithout(log, reflectionStop);
  if (!best) return null;
  const ellipse = errorEllipse(best, PROBABILITY);
  return { transmitter, log, frequencyMhz, band: band.value, isOffAtTimes, reflectionStop, best, ellipse };
}

type Heard = Omit<HeardRow, "stop" | "timeUtc">;

/** Bearing in whole degrees with the stated spread; level by exponent 3 with shadows, weaker over a reflection. */
function hear(
  place: Place,
  transmitter: Place,
  isReflected: boolean,
  levelAtOneMetre: number,
  { spread }: LocateParameters,
  random: Random,
): Heard {
  const spreadDeg = random.integer(...spread);
  const turned = random.pick([-1, 1]) * between(random, 35, 120);
  const bearing = bearingDegOf(place, transmitter) + spreadDeg * random.gaussian() + (isReflected ? turned : 0);
  const [east, north] = [transmitter.eastM - place.eastM, transmitter.northM - place.northM];
  const distanceM = Math.sqrt(east * east + north * north);
  const level = levelAtOneMetre - 30 * log10(distanceM) + 6 * random.gaussian() - (isReflected ? 6 : 0);
  return { ...place, bearingDeg: wholeTurn(Math.round(bearing)), spreadDeg, levelDbm: Math.round(level) };
}

const wholeTurn = (deg: number) => deg - 360 * Math.floor(deg / 360);

/** In the order of the patrol, some minutes from stop to stop; silent stops lie between the others. */
function drawLog(heard: readonly Heard[], silent: readonly Place[], random: Random): LogRow[] {
  const rows: Omit<LogRow, "stop" | "timeUtc">[] = [...heard];
  for (const place of silent) {
    const row = { ...place, bearingDeg: null, spreadDeg: null, levelDbm: null };
    rows.splice(random.integer(1, rows.length - 1), 0, row);
  }
  let minutes = random.integer(6 * 60, 18 * 60);
  return rows.map((row, n) => {
    minutes += random.integer(4, 9);
    return { stop: n + 1, timeUtc: clock(minutes), ...row };
  });
}

const clock = (minutes: number) =>
  [Math.floor(minutes / 60), minutes % 60].map((n) => String(n).padStart(2, "0")).join(":");

function isFair({ transmitter, log, reflectionStop, best, ellipse }: LocateTruth): boolean {
  const reach = reachInEllipse(ellipse, transmitter);
  const all = fixWith(log);
  const degrees = best.lines.length - 2;
  const others = heardRows(log).filter(({ stop }) => stop !== reflectionStop);
  const byLevel = { ...ellipse, ...placeByLevel(log) };
  return (
    reach >= REACH.from &&
    reach <= REACH.to &&
    ellipse.semiMinorM >= SEMI_AXES_M.shortest &&
    ellipse.semiMajorM <= SEMI_AXES_M.longest &&
    ellipse.semiMajorM <= LONGEST_TO_SHORTEST * ellipse.semiMinorM &&
    // The stated spreads must look true, or nobody could trust them.
    best.sumOfSquares <= degrees + 2 * Math.sqrt(2 * degrees) &&
    others.every(({ stop }) => (fixWithout(log, stop)?.sumOfSquares ?? Infinity) >= best.sumOfSquares + TELLING) &&
    all !== null &&
    reachInEllipse(errorEllipse(all, PROBABILITY), transmitter) >= CLEARLY_OUTSIDE &&
    reachInEllipse(byLevel, transmitter) >= CLEARLY_OUTSIDE
  );
}
