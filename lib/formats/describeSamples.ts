import { decibels } from "@/lib/numeric/elementary";
import { middleOf, type SampleFormat } from "./sampleFormat";

/** Values of a recording counted by size; I and Q together. */
export type Histogram = { centres: Float64Array; counts: Float64Array };

/** What a recording's numbers say about the front end that made them. */
export type SampleFacts = {
  samples: number;
  /** Mean of each part in the format's own counts: one number, or I and Q. */
  offset: readonly number[];
  /** Root of the mean square without the offset, both parts together. */
  rms: number;
  lowest: number;
  highest: number;
  /** Share of the values at an end of the format, where a larger signal could not be told; null for floating point. */
  clippedShare: number | null;
  /** `rms` below the format's largest value, in dB; for floating point below 1. -Infinity for silence. */
  levelDb: number;
  histogram: Histogram;
};

const MOST_BINS = 64;

/**
 * @param values as `createSampleDecoder` gives them: I and Q alternating when complex
 * @throws RangeError without values
 */
export function describeSamples(values: Float32Array, format: SampleFormat): SampleFacts {
  if (values.length === 0) throw new RangeError("describeSamples: the recording holds no samples");
  const parts = format.complex ? 2 : 1;
  const ends = endsOf(format);
  const sums = [0, 0];
  let squares = 0;
  let lowest = Infinity;
  let highest = -Infinity;
  let clipped = 0;
  for (let n = 0; n < values.length; n++) {
    const value = values[n];
    sums[n % parts] += value;
    squares += value * value;
    if (value < lowest) lowest = value;
    if (value > highest) highest = value;
    if (ends && (value <= ends[0] || value >= ends[1])) clipped++;
  }
  const samples = values.length / parts;
  const offset = sums.slice(0, parts).map((sum) => sum / samples);
  const variance = squares / samples - offset.reduce((sum, mean) => sum + mean * mean, 0);
  const rms = Math.sqrt(Math.max(0, variance / parts));
  return {
    samples,
    offset,
    rms,
    lowest,
    highest,
    clippedShare: ends && clipped / values.length,
    levelDb: rms > 0 ? 2 * decibels(rms / (ends ? ends[1] : 1)) : -Infinity,
    histogram: histogramOf(values, lowest, highest, ends !== null),
  };
}

const HALF_RANGE: Readonly<Record<number, number>> = { 8: 128, 16: 32_768, 32: 2_147_483_648 };

/** Smallest and largest value of a whole-number format as the decoder gives them. */
function endsOf(format: SampleFormat): readonly [number, number] | null {
  const { kind, bits } = format;
  if (kind === "float") return null;
  const half = HALF_RANGE[bits];
  const middle = middleOf(format);
  return kind === "signed" ? [-half, half - 1] : [-middle, 2 * half - 1 - middle];
}

/** Bins of equal width from the lowest to the highest value, of whole counts where values are whole. */
function histogramOf(values: Float32Array, lowest: number, highest: number, whole: boolean): Histogram {
  const span = highest - lowest;
  const width = whole ? Math.max(1, Math.ceil((span + 1) / MOST_BINS)) : span > 0 ? span / MOST_BINS : 1;
  const bins = whole ? Math.floor(span / width) + 1 : MOST_BINS;
  const counts = new Float64Array(bins);
  for (let n = 0; n < values.length; n++) counts[Math.min(bins - 1, Math.floor((values[n] - lowest) / width))]++;
  const middle = whole ? (width - 1) / 2 : width / 2;
  return { centres: Float64Array.from({ length: bins }, (_, bin) => lowest + bin * width + middle), counts };
}
