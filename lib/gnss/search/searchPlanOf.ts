import { chiSquareInverseSurvival } from "@/lib/numeric/chiSquare";
import { falseAlarmPerCell } from "../detection";
import type { SearchBand } from "./searchBand";
import { lineSpacingHz, type SearchSignal } from "./searchSignal";
import { sampleCount, type SampledCapture } from "./sampledCapture";

/** What is asked of a search. */
export type SearchRequest = {
  /** Length of one coherent sum, whole code periods up to 20 ms. */
  coherentMs: number;
  /** Number of coherent sums whose powers are added, 1 to 2000; they follow each other. */
  sums: number;
  /** Where in the capture the first sum begins; 0 when left out. */
  startMs?: number;
  /**
   * Edges of data bits fall anywhere; one inside a coherent sum costs up to all of it. With a step given the search is done
   * from several starts, one step apart, until the coherent time is covered, and the best counts.
   */
  bitEdgeStepMs?: number;
  /** The search runs at least from minus to plus this Doppler. */
  dopplerHalfWidthHz: number;
  /** Distance of the Doppler rows; 1/(2T) when left out, which costs 0.9 dB at worst. */
  dopplerStepHz?: number;
  /** Probability that noise alone passes the threshold anywhere in one satellite's grid. */
  falseAlarmPerSearch: number;
};

/** Starts of a search that tries where the data bits change, in ms from the request's own start; only 0 when none are tried. */
export function edgeStartsMs({ coherentMs, bitEdgeStepMs }: SearchRequest): number[] {
  if (bitEdgeStepMs === undefined) return [0];
  if (!(bitEdgeStepMs > 0 && coherentMs / bitEdgeStepMs <= MOST_STARTS))
    throw new RangeError(`search: at most ${MOST_STARTS} bit edges tried, got ${coherentMs} ms by ${bitEdgeStepMs} ms`);
  return Array.from({ length: Math.ceil(coherentMs / bitEdgeStepMs) }, (_, n) => n * bitEdgeStepMs);
}

/** A request checked against a capture, with everything that was left out filled in. */
export type SearchPlanInForce = {
  startS: number;
  coherentS: number;
  sums: number;
  dopplerStepHz: number;
  /** Lowest first, 0 Hz in the middle. */
  dopplersHz: Float64Array;
  falseAlarmPerSearch: number;
};

const MOST_ROWS = 4001;
const LONGEST_MS = 20;
const MOST_STARTS = 20;

/** @throws RangeError naming the rule and the value that broke it */
export function searchPlanOf(capture: SampledCapture, signal: SearchSignal, request: SearchRequest): SearchPlanInForce {
  const { coherentMs, sums, startMs = 0, dopplerHalfWidthHz, falseAlarmPerSearch } = request;
  const periods = (coherentMs / 1000) * lineSpacingHz(signal);
  if (!(periods >= 1 && Math.abs(periods - Math.round(periods)) < 1e-9 && coherentMs <= LONGEST_MS))
    throw new RangeError(
      `search: coherent time of whole code periods (${1000 / lineSpacingHz(signal)} ms each) up to ${LONGEST_MS} ms, got ${coherentMs} ms`,
    );
  if (!(Number.isInteger(sums) && sums >= 1 && sums <= 2000))
    throw new RangeError(`search: 1 to 2000 sums, got ${sums}`);
  if (!(falseAlarmPerSearch > 0 && falseAlarmPerSearch < 1))
    throw new RangeError(`search: false alarms between 0 and 1, got ${falseAlarmPerSearch}`);
  const heldMs = (1000 * sampleCount(capture)) / capture.rateHz;
  const sampleMs = 1000 / capture.rateHz; // a file of 20 ms may lack the last part of a sample
  if (!(startMs >= 0 && startMs + coherentMs * sums < heldMs + sampleMs))
    throw new RangeError(
      `search: ${coherentMs} ms x ${sums} from ${startMs} ms is longer than the capture's ${heldMs} ms`,
    );
  const dopplerStepHz = request.dopplerStepHz ?? 500 / coherentMs;
  const side = Math.ceil(dopplerHalfWidthHz / dopplerStepHz);
  if (!(dopplerStepHz > 0 && side >= 0 && 2 * side + 1 <= MOST_ROWS))
    throw new RangeError(
      `search: at most ${MOST_ROWS} Doppler rows, got ${dopplerHalfWidthHz} Hz by ${dopplerStepHz} Hz`,
    );
  return {
    startS: startMs / 1000,
    coherentS: coherentMs / 1000,
    sums,
    dopplerStepHz,
    dopplersHz: Float64Array.from({ length: 2 * side + 1 }, (_, n) => (n - side) * dopplerStepHz),
    falseAlarmPerSearch,
  };
}

/**
 * Threshold on a cell whose noise has mean 1: chi-square with two degrees per sum, all cells of the grid taken as
 * independent. They are not quite (neighbours overlap), so the true false-alarm probability is a little lower. In a mirrored
 * band a sum has one degree only.
 */
export function cellThreshold(
  { sums, dopplersHz, falseAlarmPerSearch }: SearchPlanInForce,
  { lags, mirrored }: SearchBand,
): number {
  const perCell = falseAlarmPerCell(falseAlarmPerSearch, dopplersHz.length * lags);
  const degrees = (mirrored ? 1 : 2) * sums;
  return chiSquareInverseSurvival(perCell, degrees) / degrees;
}
