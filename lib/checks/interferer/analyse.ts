import type { Capture } from "@/lib/gnss/searchSettings";
import { edgesAtLevel, type BandEdges } from "@/lib/gnss/interference/bandReading";
import { selfLikeness } from "@/lib/gnss/interference/selfLikeness";
import { powerSpectrum, type Spectrum } from "@/lib/gnss/interference/spectrum";
import type { SampledCapture } from "@/lib/gnss/search/sampledCapture";
import { decibels } from "@/lib/numeric/elementary";
import { median } from "@/lib/numeric/statistics";
import type { InterfererClass } from "./classes";
import { fullScaleDb, MHZ } from "./drawScene";
import { findRepetition } from "./findRepetition";

/** All that is read from a capture. */
export type CaptureReading = {
  class: InterfererClass;
  centreHz: number;
  bandwidthHz: number;
  periodS: number;
  levelDb: number;
  floorDb: number;
  ownLineDb: number;
};

const NOTHING_BELOW_DB = 6;
const LINE_WIDTH_HZ = 8000; // what the finest resolution makes of a single carrier, and more
const NARROW_HZ = 250_000;
const SHARE_6_DB = 0.251189; // 10^-0.6

/** The right method: take out the line at 0 Hz, floor where nothing stands, then spectrum, repetition and envelope. */
export function analyse(capture: Capture): CaptureReading {
  const { samples, offsetPower } = withoutOffset(capture);
  const sampled: SampledCapture = { samples, complex: true, rateHz: capture.rateHz, ifHz: 0 };
  const coarse = powerSpectrum(sampled, { points: 512, window: "blackman-harris", step: 307 });
  const floorPerHz = floorOf(coarse);
  const power = meanPower(samples) - floorPerHz * capture.rateHz;
  const levelDb = decibels(Math.max(power, 1e-12) / (floorPerHz * MHZ));
  const common = {
    floorDb: fullScaleDb(floorPerHz * MHZ),
    ownLineDb: decibels(Math.max(offsetPower, 1e-12) / (floorPerHz * MHZ)),
  };
  if (levelDb < NOTHING_BELOW_DB)
    return { class: "nothing", centreHz: 0, bandwidthHz: 0, periodS: 0, levelDb: 0, ...common };
  const periodS = findRepetition(
    selfLikeness(samples.subarray(0, ENOUGH), capture.rateHz, LAGS, BLOCK),
    power,
    floorPerHz * capture.rateHz,
  );
  const band = readBand(sampled, coarse, floorPerHz);
  const cls = classify(samples, band.bandwidthHz, periodS);
  const isLine = cls === "carrier";
  return { class: cls, ...band, ...(isLine && { bandwidthHz: 0 }), periodS: isLine ? 0 : periodS, levelDb, ...common };
}

const BLOCK = 16_384;
const LAGS = BLOCK / 2; // just beyond the code's millisecond
const ENOUGH = 2 * 2 * BLOCK; // I and Q of two blocks: likeness is then good to a hundredth

/** The mean of I and Q is the line at 0 Hz; what the noise leaves in it is taken off its power. */
function withoutOffset({ samples }: Capture): { samples: Float64Array; offsetPower: number } {
  const count = samples.length / 2;
  let [i, q] = [0, 0];
  for (let n = 0; n < samples.length; n += 2) {
    i += samples[n];
    q += samples[n + 1];
  }
  const [meanI, meanQ] = [i / count, q / count];
  const rest = new Float64Array(samples.length);
  for (let n = 0; n < samples.length; n += 2) {
    rest[n] = samples[n] - meanI;
    rest[n + 1] = samples[n + 1] - meanQ;
  }
  return { samples: rest, offsetPower: meanI * meanI + meanQ * meanQ };
}

function meanPower(samples: Float64Array): number {
  let sum = 0;
  for (let n = 0; n < samples.length; n++) sum += samples[n] * samples[n];
  return sum / (samples.length / 2);
}

/** Stretches near the edges, two of them about the third null of the code: the quietest is the floor. */
const QUIET_HZ = [
  [-3.95e6, -3.65e6],
  [-3.15e6, -2.99e6],
  [2.99e6, 3.15e6],
  [3.65e6, 3.95e6],
] as const;

function floorOf({ offsetsHz, densityPerHz }: Spectrum): number {
  const levels = QUIET_HZ.map(([from, to]) =>
    median(densityPerHz.filter((_, k) => offsetsHz[k] >= from && offsetsHz[k] <= to)),
  );
  const [lowest, next] = levels.sort((a, b) => a - b);
  return (lowest + next) / 2;
}

type Band = { centreHz: number; bandwidthHz: number };

/**
 * Centre and width at 6 dB, at a resolution that suits the width. Steps from transform to transform are primes, so that what
 * repeats is not caught in the same part of its repetition each time.
 */
function readBand(sampled: SampledCapture, coarse: Spectrum, floorPerHz: number): Band {
  const rough = edgesOf(coarse, floorPerHz, 0, 0);
  if (rough.highHz - rough.lowHz > NARROW_HZ) return bandOf(coarse, floorPerHz, rough.highHz - rough.lowHz);
  const fine = powerSpectrum(sampled, { points: 8192, window: "blackman-harris", step: 4093 });
  const line = edgesOf(fine, floorPerHz, 0, 0);
  if (line.highHz - line.lowHz < LINE_WIDTH_HZ) return bandOf(fine, floorPerHz, 0);
  return bandOf(powerSpectrum(sampled, { points: 2048, window: "blackman-harris", step: 1021 }), floorPerHz, 0);
}

function bandOf(spectrum: Spectrum, floorPerHz: number, wideHz: number): Band {
  const { lowHz, highHz } = edgesOf(spectrum, floorPerHz, wideHz / 4, wideHz / 16);
  return { centreHz: (lowHz + highHz) / 2, bandwidthHz: highHz - lowHz };
}

/** The top is a mean over a wider stretch than the edges are: single bins and lines of a code stand out of any hump. */
function edgesOf({ offsetsHz, densityPerHz }: Spectrum, floorPerHz: number, topHz: number, edgeHz: number): BandEdges {
  const binHz = offsetsHz[1] - offsetsHz[0];
  const excess = densityPerHz.map((density) => density - floorPerHz);
  const over = (widthHz: number) => smoothed(excess, Math.round(widthHz / binHz / 2));
  const top = over(topHz).reduce((most, value) => Math.max(most, value), 0);
  return edgesAtLevel(offsetsHz, over(edgeHz), SHARE_6_DB * top);
}

/** Mean over so many bins on either side. */
function smoothed(values: Float64Array, half: number): Float64Array {
  if (half < 1) return values;
  return values.map((_, k) => {
    let sum = 0;
    for (let n = -half; n <= half; n++) sum += values[Math.min(values.length - 1, Math.max(0, k + n))];
    return sum / (2 * half + 1);
  });
}

function classify(samples: Float64Array, bandwidthHz: number, periodS: number): InterfererClass {
  if (periodS === 0) return bandwidthHz < LINE_WIDTH_HZ ? "carrier" : "noise";
  if (isGated(samples)) return "pulse";
  if (bandwidthHz < NARROW_HZ) return "narrow-fm";
  return Math.abs(periodS - 1e-3) < 1e-5 ? "code" : "sweep";
}

const SMOOTHED = 8; // samples, about a microsecond

/** Whether the power stands far under its mean most of the time. */
function isGated(samples: Float64Array): boolean {
  const powers = new Float64Array(Math.floor(samples.length / 2 / SMOOTHED));
  for (let block = 0; block < powers.length; block++) {
    let sum = 0;
    for (let n = 2 * SMOOTHED * block; n < 2 * SMOOTHED * (block + 1); n++) sum += samples[n] * samples[n];
    powers[block] = sum;
  }
  const mean = powers.reduce((sum, value) => sum + value, 0) / powers.length;
  return median(powers) < mean / 2;
}
