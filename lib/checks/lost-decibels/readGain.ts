import type { Readings } from "@/lib/gnss/sky/receiverLog";
import { fitLine, mean } from "@/lib/numeric/statistics";
import { findSteps } from "../receiver-log/findSteps";

/** What the gain control did: stepped, crept, or nothing. */
export type GainReading = { change: "up" | "down" | "creeps" | "none"; readings: Readings | null; byDb: number };

const LEAST_STEP_DB = 1;
const LEAST_CREEP_DB = 1.5; // three times what a day does to it
const FEW = 0.04; // of the log, at either end

export function readGain(gainDb: readonly number[]): GainReading {
  const [first, ...others] = findSteps(gainDb, LEAST_STEP_DB);
  if (first) {
    const back = others.find(({ size }) => Math.sign(size) !== Math.sign(first.size));
    const readings: Readings = [first.at, back ? back.at - 1 : gainDb.length - 1];
    return { change: first.size > 0 ? "up" : "down", readings, byDb: first.size };
  }
  const few = Math.max(10, Math.round(FEW * gainDb.length));
  const byDb = mean(gainDb.slice(-few)) - mean(gainDb.slice(0, few));
  if (!(Math.abs(byDb) >= LEAST_CREEP_DB)) return { change: "none", readings: null, byDb: 0 };
  return { change: "creeps", readings: [footOf(gainDb), gainDb.length - 1], byDb };
}

const FIRST_FOOT = 0.08;
const LAST_FOOT = 0.85;
const PLACES = 160;

/** Where a level turns into a slope: the reading that leaves the least squares about a level and a line from it. */
function footOf(values: readonly number[]): number {
  let [best, least] = [0, Infinity];
  for (let place = 0; place <= PLACES; place++) {
    const foot = Math.round((FIRST_FOOT + ((LAST_FOOT - FIRST_FOOT) * place) / PLACES) * values.length);
    const left = squaresAboutBend(values, foot);
    if (left < least) [least, best] = [left, foot];
  }
  return best;
}

const STRIDE = 4; // every fourth reading says as much about a slope of hours

function squaresAboutBend(values: readonly number[], foot: number): number {
  const x: number[] = [];
  const y: number[] = [];
  for (let n = 0; n < values.length; n += STRIDE) {
    x.push(Math.max(0, n - foot));
    y.push(values[n]);
  }
  const { slope, intercept } = fitLine(x, y);
  return y.reduce((sum, value, n) => sum + (value - intercept - slope * x[n]) * (value - intercept - slope * x[n]), 0);
}
