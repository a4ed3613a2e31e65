import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { correlatorTrace } from "@/lib/gnss/correlatorTrace";
import { decibels } from "@/lib/numeric/elementary";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { circularDifference } from "../circularDifference";
import type { CorrelatorReadingParameters } from "./parameters";
import { readTrace, type TraceReading } from "./readTrace";

export type CorrelatorReadingTruth = {
  prn: number;
  coherentMs: number;
  falseAlarmPerCell: number;
  signal: { delayChips: number; cn0TDb: number } | null;
  /** What `lag` is marked against: the delay that was put in, or the highest cell of noise. */
  lagChips: number;
  trace: number[];
  reading: TraceReading;
};

export type DrawnCase = { truth: CorrelatorReadingTruth; draws: number };

const COHERENT_MS = [1, 2, 4, 5, 10, 20] as const;
const SIGMA_COUNTS = { from: 2, to: 20 } as const; // so that no level is the same from case to case
const LAST_FIGURE = 1e4;
const LARGEST_OWN_ERROR_CHIPS = 0.15; // of the highest cell: a right reading must stay within the tolerance of 0.2
const CLEAR_OF_THRESHOLD = 1.08; // a careful noise mean must not turn the detection round

/** Draws until a right reading is possible and no named wrong method lands on it by chance. */
export function drawCase(seedHex: string, parameters: CorrelatorReadingParameters): DrawnCase {
  const first = seededRandom(seedHex, "correlator-reading@1/case");
  const hasSignal = !(first.uniform() * 100 < parameters.noiseOnly); // before the draws, so that refusing does not move the share
  for (let draws = 1; draws <= 200; draws++) {
    const random = seededRandom(seedHex, `correlator-reading@1/draw-${draws}`);
    const truth = drawTruth(parameters, hasSignal, random);
    if (isFair(truth)) return { truth, draws };
  }
  throw new Error("correlator-reading: no fair trace in 200 draws");
}

function drawTruth(
  parameters: CorrelatorReadingParameters,
  hasSignal: boolean,
  random: Random,
): CorrelatorReadingTruth {
  const { falseAlarm: falseAlarmPerCell } = parameters;
  const prn = random.integer(...parameters.prn);
  const coherentMs = random.pick(COHERENT_MS);
  const sigma = SIGMA_COUNTS.from + random.uniform() * (SIGMA_COUNTS.to - SIGMA_COUNTS.from);
  const delayChips = random.integer(0, 10 * CA_LENGTH_CHIPS - 1) / 10;
  const [lowest, highest] = parameters.cn0T;
  const cn0TDb = lowest + random.uniform() * (highest - lowest);
  const signal = hasSignal ? { delayChips, cn0TDb } : null;
  const cn0DbHz = hasSignal ? cn0TDb - decibels(coherentMs / 1000) : null;
  const inSigma = correlatorTrace({ prn, delayChips, cn0DbHz, coherentMs, random });
  // What is shown is what is marked, so the readings are taken after the rounding.
  const trace = Array.from(inSigma, (value) => Math.round(value * sigma * LAST_FIGURE) / LAST_FIGURE);
  const reading = readTrace(trace, falseAlarmPerCell);
  const lagChips = signal ? delayChips : reading.highestLagChips;
  return { prn, coherentMs, falseAlarmPerCell, signal, lagChips, trace, reading };
}

function isFair({ signal, lagChips, reading }: CorrelatorReadingTruth): boolean {
  const ownError = Math.abs(circularDifference(reading.highestLagChips, lagChips, CA_LENGTH_CHIPS));
  const clear = signal
    ? reading.highest >= reading.threshold * CLEAR_OF_THRESHOLD
    : reading.highest <= reading.threshold / CLEAR_OF_THRESHOLD;
  const mirrored = Math.abs(circularDifference(CA_LENGTH_CHIPS - lagChips, lagChips, CA_LENGTH_CHIPS));
  return ownError <= LARGEST_OWN_ERROR_CHIPS && clear && mirrored > 1;
}
