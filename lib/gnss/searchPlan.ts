import { cosTurns, PI, sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { CA_LENGTH_CHIPS, DATA_BIT_MS } from "./constants";
import {
  coherentSnr,
  detectionProbability,
  falseAlarmOfThreshold,
  falseAlarmPerCell,
  falseAlarmPerSearch,
  searchTimeS,
  thresholdSigma2,
} from "./detection";
import { createDetectionCurve } from "./detectionCurve";

/** A search plan and the satellite it is meant for. */
export type SearchPlan = {
  cn0DbHz: number;
  /** Coherent time, above 0 and up to 20 ms. */
  coherentMs: number;
  /** Number of powers added. */
  sums: number;
  dopplerBinHz: number;
  codeStepChips: number;
  /** Half width of the Doppler window. */
  windowHz: number;
  correlators: number;
  bitEdgesKnown: false;
  /** Satellites drawn; 5000 give a standard error of at most 0.7 points. */
  draws: number;
  random: Random;
} & (
  | {
      /** On the sum of K squares, noise power per component = 1. */ thresholdSigma2: number;
      falseAlarmPerSearch?: undefined;
    }
  | { falseAlarmPerSearch: number; thresholdSigma2?: undefined }
);

export type PlanPerformance = {
  cells: number;
  thresholdSigma2: number;
  falseAlarmPerCell: number;
  falseAlarmPerSearch: number;
  /** Mean over the draws. */
  detection: number;
  detectionStandardError: number;
  searchTimeS: number;
};

/**
 * What a search plan attains. Cells: (2 ceil(W/bin) + 1) * 1023/step; false alarms by the central chi-square law of 2K
 * degrees, cells taken as independent; time = cells * T * K / correlators. Detection: the satellite's code phase lies
 * anywhere within half a step of the nearest cell, its Doppler within half a bin, the first bit edge anywhere in 20 ms, and
 * each bit is a coin; each draw is a noncentral chi-square probability and their mean is taken. Common practice, no source;
 * its parts are those of `detection.ts`.
 */
export function planPerformance(plan: SearchPlan): PlanPerformance {
  check(plan);
  const cells = cellsOf(plan);
  const threshold =
    plan.thresholdSigma2 ?? thresholdSigma2(falseAlarmPerCell(plan.falseAlarmPerSearch, cells), plan.sums);
  const perCell = falseAlarmOfThreshold(threshold, plan.sums);
  const drawSnr = createSnrDraw(plan);
  let sum = 0;
  let squares = 0;
  for (let n = 0; n < plan.draws; n++) {
    const detection = detectionProbability(threshold, plan.sums, drawSnr());
    sum += detection;
    squares += detection * detection;
  }
  const detection = sum / plan.draws;
  const variance = Math.max(0, squares / plan.draws - detection * detection);
  return {
    cells,
    thresholdSigma2: threshold,
    falseAlarmPerCell: perCell,
    falseAlarmPerSearch: falseAlarmPerSearch(perCell, cells),
    detection,
    detectionStandardError: Math.sqrt(variance / plan.draws),
    searchTimeS: searchTimeS(cells, plan.coherentMs / 1000, plan.sums, plan.correlators),
  };
}

/**
 * Detection probability of a plan alone, for screens that follow every change of it at once: the same draws as
 * `planPerformance`, their probabilities from a curve. Within 1e-6 of its `detection`; what is marked comes from there.
 */
export function planDetection(plan: SearchPlan): number {
  check(plan);
  const cells = cellsOf(plan);
  const threshold =
    plan.thresholdSigma2 ?? thresholdSigma2(falseAlarmPerCell(plan.falseAlarmPerSearch, cells), plan.sums);
  const detection = createDetectionCurve(threshold, plan.sums);
  const drawSnr = createSnrDraw(plan);
  let sum = 0;
  for (let n = 0; n < plan.draws; n++) sum += detection(drawSnr());
  return sum / plan.draws;
}

const cellsOf = ({ windowHz, dopplerBinHz, codeStepChips }: SearchPlan): number =>
  (2 * Math.ceil(windowHz / dopplerBinHz) + 1) * (CA_LENGTH_CHIPS / codeStepChips);

/** Draws satellites one after the other. @returns a function that gives the mean ratio rho of the K coherent sums of the next */
function createSnrDraw({ cn0DbHz, coherentMs, sums, dopplerBinHz, codeStepChips, random }: SearchPlan): () => number {
  const snr = coherentSnr(cn0DbHz, coherentMs / 1000);
  return () => {
    const offsetChips = (random.uniform() - 0.5) * codeStepChips;
    const turns = ((random.uniform() - 0.5) * dopplerBinHz * coherentMs) / 1000; // phase gained in one coherent sum
    const code = Math.max(0, 1 - Math.abs(offsetChips));
    const end = { c: cosTurns(turns), s: sinTurns(turns) };
    const smooth = powerLeft(turns, end, 1, 0);
    let power = sums * smooth;
    for (let edgeMs = random.uniform() * DATA_BIT_MS; edgeMs < sums * coherentMs; edgeMs += DATA_BIT_MS) {
      if (random.uniform() < 0.5) continue;
      const place = edgeMs / coherentMs;
      power += flippedPower(turns, end, place - Math.floor(place)) - smooth;
    }
    return (snr * code * code * power) / sums;
  };
}

type PhaseAtEnd = { c: number; s: number };

/** Power left of a coherent sum whose phase gains `turns` and whose sign flips at fraction a. */
function flippedPower(turns: number, end: PhaseAtEnd, a: number): number {
  if (Math.abs(turns) < NO_TURNS) return (1 - 2 * a) * (1 - 2 * a);
  return powerLeft(turns, end, cosTurns(turns * a), sinTurns(turns * a));
}

/** |2 E(a) - 1 - E(1)|^2/(2 pi turns)^2, c and s being the parts of E(a). */
function powerLeft(turns: number, end: PhaseAtEnd, c: number, s: number): number {
  if (Math.abs(turns) < NO_TURNS) return 1;
  const re = 2 * c - 1 - end.c;
  const im = 2 * s - end.s;
  return (re * re + im * im) / (2 * PI * turns * (2 * PI * turns));
}

const NO_TURNS = 1e-6;

function check(plan: SearchPlan): void {
  const rules: [boolean, string, number][] = [
    [plan.coherentMs > 0 && plan.coherentMs <= DATA_BIT_MS, "coherent time above 0 up to 20 ms", plan.coherentMs],
    [Number.isInteger(plan.sums) && plan.sums >= 1 && plan.sums <= 2000, "1 to 2000 sums", plan.sums],
    [plan.dopplerBinHz > 0, "Doppler bin above 0", plan.dopplerBinHz],
    [plan.codeStepChips > 0 && plan.codeStepChips <= 2, "code step above 0 up to 2 chips", plan.codeStepChips],
    [plan.windowHz >= 0, "window from 0", plan.windowHz],
    [plan.correlators >= 1, "at least one correlator", plan.correlators],
    [Number.isInteger(plan.draws) && plan.draws >= 2, "at least two draws", plan.draws],
  ];
  for (const [holds, rule, value] of rules) if (!holds) throw new RangeError(`planPerformance: ${rule}, got ${value}`);
}
