import { sampleCount, type SampledCapture } from "../search/sampledCapture";
import { powerSpectrum, type Spectrogram } from "./spectrum";

/** A stretch of a capture; null for all that follows its beginning. */
export type Stretch = { fromS: number; lengthS: number | null };

export type StretchSpectrogram = Spectrogram & {
  /** What one row stands for: nothing shorter can be told apart in time. */
  rowS: number;
  /** Transforms averaged in each row. */
  averaged: number;
};

const MOST_ROWS = 200; // about as many as a plot has px to show
const FEWEST_POINTS = 32;
const MOST_POINTS = 512;

/**
 * Spectrogram of a stretch in at most 200 rows that together hold all of its samples, so that nothing short falls between
 * them: a row of many samples is an average of transforms half of whose samples overlap (Welch, 1967). The points of a
 * transform are near the root of the samples, where time and frequency are resolved alike, from 32 to 512.
 * @returns densities row after row
 * @throws RangeError for a stretch of fewer than 32 samples
 */
export function stretchSpectrogram(capture: SampledCapture, { fromS, lengthS }: Stretch): StretchSpectrogram {
  const { rateHz, complex } = capture;
  const total = sampleCount(capture);
  const from = Math.floor(fromS * rateHz);
  const samples = Math.min(total - from, lengthS === null ? Infinity : Math.floor(lengthS * rateHz));
  if (!(fromS >= 0 && samples >= FEWEST_POINTS))
    throw new RangeError(
      `stretchSpectrogram: ${FEWEST_POINTS} samples at least, got ${Math.max(0, samples)} from ${fromS} s on`,
    );
  const points = pointsFor(samples);
  const step = points / 2;
  const rows = Math.min(MOST_ROWS, 1 + Math.floor((samples - points) / step));
  // A row ends where its last transform ends, behind the beginning of the next row.
  const perRow = points + (rows < MOST_ROWS ? 0 : step * Math.ceil(Math.max(0, samples / rows - points) / step));
  const parts = complex ? 2 : 1;
  const spectra = Array.from({ length: rows }, (_, row) => {
    const first = from + firstOf(row, rows, samples, perRow);
    const held = { ...capture, samples: capture.samples.subarray(parts * first, parts * (first + perRow)) };
    return { first, ...powerSpectrum(held, { points, window: "blackman-harris", step }) };
  });
  const { offsetsHz, resolutionHz, averaged } = spectra[0];
  const densityPerHz = new Float64Array(rows * offsetsHz.length);
  spectra.forEach((spectrum, row) => densityPerHz.set(spectrum.densityPerHz, row * offsetsHz.length));
  const timesS = Float64Array.from(spectra, ({ first }) => (first + perRow / 2) / rateHz);
  return { offsetsHz, densityPerHz, timesS, resolutionHz, rowS: perRow / rateHz, averaged };
}

function pointsFor(samples: number): number {
  let points = FEWEST_POINTS;
  while (points < MOST_POINTS && 2 * points * points <= samples) points *= 2;
  return points;
}

/** Rows stand evenly from the first sample to the last. */
const firstOf = (row: number, rows: number, samples: number, perRow: number): number =>
  rows === 1 ? 0 : Math.round((row * (samples - perRow)) / (rows - 1));
