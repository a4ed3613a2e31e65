import { CA_LENGTH_CHIPS } from "./constants";
import { samplesPerCodePeriod } from "./doppler";

/** How a capture is searched for one satellite. */
export type SearchSettings = {
  /** Length of one coherent sum, whole milliseconds 1 to 20. */
  coherentMs: number;
  /** Number of coherent sums whose powers are added, 1 to 500; they follow each other from the first sample. */
  sums: number;
  /** The search runs at least from minus to plus this Doppler. */
  dopplerHalfWidthHz: number;
  dopplerStepHz: number;
  /** Probability that noise alone passes the threshold anywhere in the search for one satellite. */
  falseAlarmPerSearch: number;
};

/** Complex samples, I and Q alternating, at zero intermediate frequency. */
export type Capture = { samples: Int8Array; rateHz: number };

/** Lags of one code period in a search: two per chip, and the power of two that the transform wants. */
export const SEARCH_LAGS = 2048;

const MOST_DOPPLERS = 4001;

/** Dopplers of a search in Hz, lowest first: 2 ceil(W/step) + 1 rows, 0 Hz in the middle. */
export function searchDopplersHz(settings: SearchSettings): Float64Array {
  const { dopplerHalfWidthHz, dopplerStepHz } = settings;
  const side = Math.ceil(dopplerHalfWidthHz / dopplerStepHz);
  if (!(dopplerStepHz > 0 && side >= 0 && 2 * side + 1 <= MOST_DOPPLERS))
    throw new RangeError(
      `searchDopplersHz: at most ${MOST_DOPPLERS} bins, got ${dopplerHalfWidthHz} Hz by ${dopplerStepHz} Hz`,
    );
  return Float64Array.from({ length: 2 * side + 1 }, (_, n) => (n - side) * dopplerStepHz);
}

/** Code phases at the first sample that a search tries, in chips. */
export const searchLagsChips = (): Float64Array =>
  Float64Array.from({ length: SEARCH_LAGS }, (_, n) => (n * CA_LENGTH_CHIPS) / SEARCH_LAGS);

/** Refuses settings that the capture cannot serve. @throws RangeError naming the rule and the value */
export function checkSearch({ samples, rateHz }: Capture, settings: SearchSettings): void {
  const { coherentMs, sums, falseAlarmPerSearch } = settings;
  if (!(Number.isInteger(coherentMs) && coherentMs >= 1 && coherentMs <= 20))
    throw new RangeError(`search: coherent time of 1 to 20 whole milliseconds, got ${coherentMs}`);
  if (!(Number.isInteger(sums) && sums >= 1 && sums <= 500)) throw new RangeError(`search: 1 to 500 sums, got ${sums}`);
  if (!(falseAlarmPerSearch > 0 && falseAlarmPerSearch < 1))
    throw new RangeError(`search: false alarms between 0 and 1, got ${falseAlarmPerSearch}`);
  const heldMs = samples.length / 2 / samplesPerCodePeriod(rateHz);
  if (coherentMs * sums > heldMs)
    throw new RangeError(`search: ${coherentMs} ms x ${sums} is longer than the capture's ${heldMs} ms`);
}
