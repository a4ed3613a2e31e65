import { cosTurns } from "@/lib/numeric/elementary";

/**
 * Windows by name; cosine coefficients of Harris, "On the use of windows for harmonic analysis with the DFT" (1978).
 */
const COEFFICIENTS = {
  rectangular: [1],
  hann: [0.5, 0.5],
  "blackman-harris": [0.35875, 0.48829, 0.14128, 0.01168],
} as const;

export type WindowName = keyof typeof COEFFICIENTS;

/** A window of a length and how wide it makes a line. */
export type Window = { values: Float64Array; noiseBandwidthBins: number };

/**
 * Window for a transform: sum over k of (-1)^k a_k cos(2 pi k n / N).
 * @returns values and the equivalent noise bandwidth in bins, N sum w^2 / (sum w)^2: 1, 1.5 and 2.0 for the three
 */
export function windowOf(name: WindowName, length: number): Window {
  const values = Float64Array.from({ length }, (_, n) =>
    COEFFICIENTS[name].reduce<number>((sum, a, k) => sum + (k % 2 ? -a : a) * cosTurns((k * n) / length), 0),
  );
  const sum = values.reduce((total, value) => total + value, 0);
  const squares = values.reduce((total, value) => total + value * value, 0);
  return { values, noiseBandwidthBins: (length * squares) / (sum * sum) };
}
