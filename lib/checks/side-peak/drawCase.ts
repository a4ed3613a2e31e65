import { boc } from "@/lib/gnss/spectra/modulation";
import { correlationShape } from "@/lib/gnss/tracking/correlationShape";
import { traceNoise } from "@/lib/gnss/tracking/traceNoise";
import { pow10Db } from "@/lib/numeric/elementary";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { isFair } from "./isFair";
import type { SidePeakParameters } from "./parameters";
import { readPeaks, type Peaks } from "./readPeaks";
import { reflectedShape, type Reflection } from "./reflectedShape";

export type TrackedPeak = "main" | "earlier" | "later";

export type SidePeakTruth = {
  tracked: TrackedPeak;
  trackedLagChips: number;
  bandwidthHz: number;
  averagedMs: number;
  cn0TDb: number;
  reflection: Reflection;
  /** Peaks without noise: what the readings are marked against. */
  peaks: Peaks;
  fromChips: number;
  /** |R| by lag from `fromChips` on, `STEP_CHIPS` apart. */
  trace: number[];
};

export type DrawnCase = { truth: SidePeakTruth; draws: number };

export const STEP_CHIPS = 0.005;
const POINTS = 721; // 3.6 chips: the main peak and both its side peaks, wherever the loop rests
const AVERAGED_MS = [100, 200, 500, 1000] as const;
const LAG_CHIPS = { from: 50, to: 10_180 } as const; // inside the 10 230 chips of the code
const LOOP_OFFSET_CHIPS = 0.008; // of a loop at rest on an uneven peak
const SIGMA_COUNTS = { from: 2, to: 20 } as const; // so that no level is the same from case to case
/** A reflection off something near: close enough not to have a peak of its own, strong enough to make the side peaks unequal. */
const REFLECTION = { ratio: [0.25, 0.5], extraChips: [0.12, 0.35] } as const;

/** Draws until the peaks are clear, a right reading is possible and no named wrong method lands on it by chance. */
export function drawCase(seedHex: string, parameters: SidePeakParameters): DrawnCase {
  const first = seededRandom(seedHex, "side-peak@1/case");
  const mainShare = first.uniform() * 100 < parameters.mainShare; // before the draws, so that refusing does not move the share
  const side = first.pick(["earlier", "later"] as const);
  for (let draws = 1; draws <= 200; draws++) {
    const random = seededRandom(seedHex, `side-peak@1/draw-${draws}`);
    const truth = drawTruth(parameters, mainShare ? "main" : side, random);
    if (truth) return { truth, draws };
  }
  throw new Error("side-peak: no fair trace in 200 draws");
}

function drawTruth(parameters: SidePeakParameters, tracked: TrackedPeak, random: Random): SidePeakTruth | null {
  const bandwidthHz = Math.round(between(random, ...parameters.bandwidth) * 10) * 1e5;
  const averagedMs = random.pick(AVERAGED_MS);
  const cn0TDb = between(random, ...parameters.cn0T);
  const reflection: Reflection = {
    ratio: between(random, ...REFLECTION.ratio),
    extraChips: between(random, ...REFLECTION.extraChips),
    turns: random.uniform(),
  };
  const delayChips = random.integer(1000 * LAG_CHIPS.from, 1000 * LAG_CHIPS.to) / 1000;
  const shape = reflectedShape(correlationShape(boc(1, 1), bandwidthHz), reflection);
  const peaks = shape.peaksAt(delayChips);
  if (!peaks) return null;
  const offsetChips = between(random, -LOOP_OFFSET_CHIPS, LOOP_OFFSET_CHIPS);
  const trackedLagChips = Math.round((peaks[tracked].lagChips + offsetChips) * 1000) / 1000;
  const middle = Math.round((trackedLagChips + between(random, -0.15, 0.15)) / STEP_CHIPS);
  const fromChips = (middle - (POINTS - 1) / 2) * STEP_CHIPS;
  const noise = traceNoise(boc(1, 1), bandwidthHz, { fromChips, stepChips: STEP_CHIPS, count: POINTS }, random);
  const peak = Math.sqrt(2 * pow10Db(cn0TDb));
  const sigma = between(random, SIGMA_COUNTS.from, SIGMA_COUNTS.to);
  const trace = Array.from({ length: POINTS }, (_, n) => {
    const [re, im] = shape.at(fromChips + n * STEP_CHIPS - delayChips);
    const [i, q] = [peak * re + noise[2 * n], peak * im + noise[2 * n + 1]];
    return Math.round(sigma * Math.sqrt(i * i + q * q) * 1000) / 1000; // what is shown is what is marked
  });
  const read = readPeaks(trace, fromChips, STEP_CHIPS);
  if (!isFair(peaks, read)) return null;
  return { tracked, trackedLagChips, bandwidthHz, averagedMs, cn0TDb, reflection, peaks, fromChips, trace };
}
