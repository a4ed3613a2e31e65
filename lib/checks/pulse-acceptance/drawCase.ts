import { MAX_TIME_ERROR_NS } from "@/lib/gnss/timing/clockLimits";
import { leaveOut } from "@/lib/gnss/timing/cleanTimeError";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { drawSeries, drawShape, INTERVAL_S, type LogShape } from "./drawSeries";
import { CLASSES, CLEAR_NS, isFair } from "./isFair";
import { judgeLog, timeErrorOf, type LogFigures, type MtieIntervals } from "./judgeLog";
import type { PulseAcceptanceParameters } from "./parameters";

export type PulseClock = "PRTC-A" | "PRTC-B";

export type PulseAcceptanceTruth = {
  clock: PulseClock;
  limitNs: number;
  /** Delays of the counter's two leads: from the reference, and from the receiver. */
  startCableNs: number;
  stopCableNs: number;
  intervals: MtieIntervals;
  intervalS: number;
  /** As the counter shows them, to 0.1 ns. */
  readingsNs: number[];
  shape: LogShape;
  figures: LogFigures;
  accepted: boolean;
};

export type DrawnCase = { truth: PulseAcceptanceTruth; draws: number };

const SHORT_S = [300, 600, 1500] as const;
const LONG_S = [6000, 15_000, 30_000] as const;
const FARTHEST = 1.7; // limits that a log which does not keep its own reaches at most
const LARGEST_MEAN_NS = 150;

/** Draws until a right reading is possible and no named wrong method lands on it by chance. */
export function drawCase(seedHex: string, parameters: PulseAcceptanceParameters): DrawnCase {
  const first = seededRandom(seedHex, "pulse-acceptance@1/case"); // before the draws, so that refusing does not move the shares
  const clock = parameters.limit === "either" ? first.pick(CLASSES) : parameters.limit;
  const accepted = first.uniform() < 0.5;
  const hasStep = !(first.uniform() * 100 < parameters.stepless);
  for (let draws = 1; draws <= 2000; draws++) {
    const random = seededRandom(seedHex, `pulse-acceptance@1/draw-${draws}`);
    const truth = drawTruth({ clock, accepted, shape: drawShape(parameters, hasStep, random) }, random);
    if (truth && isFair(truth)) return { truth, draws };
  }
  throw new Error("pulse-acceptance: no fair log in 2 000 draws");
}

type Wanted = { clock: PulseClock; accepted: boolean; shape: LogShape };

/** Null when such a log cannot come to such a verdict. */
function drawTruth({ clock, accepted, shape }: Wanted, random: Random): PulseAcceptanceTruth | null {
  const limitNs = MAX_TIME_ERROR_NS[clock];
  const series = drawSeries(shape, random);
  const constantNs = drawConstant(series, accepted, limitNs, random);
  if (constantNs === null) return null;
  const [startCableNs, stopCableNs] = [between(random, 8, 70), between(random, 8, 70)].map(toTenth);
  const missed = new Map(shape.triggers.map(({ index, sizeNs }) => [index, sizeNs]));
  const readingsNs = Array.from(series, (value, n) =>
    toTenth(value + constantNs + (missed.get(n) ?? 0) + stopCableNs - startCableNs),
  );
  const intervals = { shortS: random.pick(SHORT_S), longS: random.pick(LONG_S) };
  const clean = leaveOut(timeErrorOf(INTERVAL_S, readingsNs, { startCableNs, stopCableNs }), [...missed.keys()]);
  const figures = judgeLog(clean, intervals);
  const cables = { startCableNs, stopCableNs };
  return { clock, limitNs, ...cables, intervals, intervalS: INTERVAL_S, readingsNs, shape, figures, accepted };
}

/** The constant part that brings max|TE| to a place on the wanted side of the limit; null where no place is free. */
function drawConstant(series: Float64Array, accepted: boolean, limitNs: number, random: Random): number | null {
  const [lowest, highest] = series.reduce(
    ([low, high], value) => [Math.min(low, value), Math.max(high, value)],
    [0, 0],
  );
  const least = (highest - lowest) / 2 + 1;
  const [from, to] = accepted ? [least, limitNs - CLEAR_NS] : [Math.max(least, limitNs + CLEAR_NS), FARTHEST * limitNs];
  if (!(from < to)) return null;
  const maxTeNs = between(random, from, to);
  if (CLASSES.some((one) => Math.abs(maxTeNs - MAX_TIME_ERROR_NS[one]) < CLEAR_NS)) return null;
  const constantNs = random.pick([-1, 1]) > 0 ? maxTeNs - highest : -maxTeNs - lowest;
  return Math.abs(constantNs) <= LARGEST_MEAN_NS ? constantNs : null;
}

const toTenth = (ns: number): number => Math.round(ns * 10) / 10 + 0; // no minus zero
