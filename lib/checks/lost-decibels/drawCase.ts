import { bandMeans, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";
import { sinTurns } from "@/lib/numeric/elementary";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { drawStart } from "../drawStart";
import { drawSky, type SkyTimes } from "../receiver-log/drawSky";
import { drawPattern, drawReadings } from "../receiver-log/levels";
import { drawFault, lossOf, shareAt, type Fault } from "./drawFault";
import { isReadable } from "./isReadable";
import type { LostDecibelsParameters } from "./parameters";
import type { Cause } from "./quantities";

export type LostDecibelsTruth = {
  cause: Cause;
  fault: Fault | null;
  /** Means outside the fault, as the form asks them, and over all elevations. */
  highDbHz: number;
  lowDbHz: number;
  allDbHz: number;
  log: ReceiverLog;
  gainDb: number[];
  currentMa: number[];
};

export type DrawnCase = { truth: LostDecibelsTruth; draws: number };

const FAULTS = ["blockage", "interference", "loss", "water"] as const;
const TRACK_S = 300;
const MOST_DRAWS = 400;

/** Draws until the log shows what happened and no named wrong method lands on it by chance. */
export function drawCase(seedHex: string, parameters: LostDecibelsParameters): DrawnCase {
  const first = seededRandom(seedHex, "lost-decibels@1/case"); // before the draws, so that refusing moves no share
  const cause = first.uniform() * 100 < parameters.nothing ? "nothing" : first.pick(FAULTS);
  for (let draws = 1; draws <= MOST_DRAWS; draws++) {
    const random = seededRandom(seedHex, `lost-decibels@1/draw-${draws}`);
    const truth = drawTruth(parameters, cause, random);
    if (truth) return { truth, draws };
  }
  throw new Error(`lost-decibels: no fair log in ${MOST_DRAWS} draws`);
}

function drawTruth(parameters: LostDecibelsParameters, cause: Cause, random: Random): LostDecibelsTruth | null {
  const times = drawTimes(random, parameters);
  const sky = drawSky(random, times);
  const pattern = drawPattern(random);
  const fault = cause === "nothing" ? null : drawFault(random, cause, sky, times, pattern, parameters);
  if (cause !== "nothing" && !fault) return null;
  const log = { ...times, passes: drawReadings(random, sky, times, pattern, lossOf(fault, times)) };
  const bands = bandMeans(log, fault?.readings ?? null);
  const [low, high] = [bands[1], bands[5]];
  const all = bands.reduce((sum, { readings }) => sum + readings, 0);
  const allDbHz = bands.reduce((sum, band) => sum + (band.readings ? band.meanDbHz * band.readings : 0), 0) / all;
  const enough = low.readings >= LEAST_READINGS && high.readings >= LEAST_READINGS;
  if (!enough || !(high.meanDbHz - allDbHz >= LEAST_SPREAD_DB)) return null;
  const columns = drawColumns(random, times, fault);
  if (!isReadable({ cause, fault, log, gainDb: columns.gainDb })) return null;
  return { cause, fault, highDbHz: high.meanDbHz, lowDbHz: low.meanDbHz, allDbHz, log, ...columns };
}

const LEAST_READINGS = 60;
const LEAST_SPREAD_DB = 1.6; // beyond the widest tolerance that a lead may set

/** The longer the log, the further apart its readings: a file for a phone on a bad link. */
function drawTimes(random: Random, { hours: [shortest, longest] }: LostDecibelsParameters): SkyTimes {
  const hours = random.integer(shortest, longest);
  const intervalS = hours <= 4 ? 10 : hours <= 8 ? 15 : hours <= 12 ? 20 : 30;
  return {
    startUnixMs: Date.parse(drawStart(random)),
    intervalS,
    readings: (hours * 3600) / intervalS,
    trackEvery: TRACK_S / intervalS,
  };
}

const GAIN_NOISE_DB = 0.15;
const CURRENT_NOISE_MA = 0.2;
const DAILY_GAIN_DB = 0.25; // the amplifier's gain goes with its temperature; common practice, no source
const DAILY_CURRENT_MA = 0.3;

/** Gain control and antenna current: level, wave of the day, noise, fault; tenths. */
function drawColumns(random: Random, { startUnixMs, intervalS, readings }: SkyTimes, fault: Fault | null) {
  const gain = between(random, 22, 38);
  const current = between(random, 24, 55);
  const coldest = random.uniform();
  const days = (reading: number) => (startUnixMs / 1000 + reading * intervalS) / 86_400;
  const column = (level: number, wave: number, noise: number, whole: number) =>
    Array.from({ length: readings }, (_, reading) => {
      const share = fault ? shareAt(fault, reading) : 0;
      const value = level + wave * sinTurns(coldest + days(reading)) + noise * random.gaussian() + whole * share;
      return Math.round(10 * value) / 10;
    });
  return {
    gainDb: column(gain, DAILY_GAIN_DB, GAIN_NOISE_DB, fault?.gainDb ?? 0),
    currentMa: column(current, DAILY_CURRENT_MA, CURRENT_NOISE_MA, fault?.currentMa ?? 0),
  };
}
