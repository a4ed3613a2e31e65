import { createFft } from "@/lib/numeric/fft";

/** How like itself a signal is some time later. */
export type SelfLikeness = {
  /** Seconds from one lag to the next; the first is 0. */
  stepS: number;
  /** |R| at each lag, in squared units of the samples: at 0 the mean power. */
  magnitude: Float64Array;
};

/**
 * Magnitude of the autocorrelation |mean x*(n) x(n + lag)| of complex samples: blocks with as many zeros behind them,
 * their power spectra averaged and transformed back. Oppenheim & Schafer, "Discrete-Time Signal Processing", chapter on
 * the discrete Fourier transform. What repeats comes back to its own power after each repetition; noise never does.
 * @param samples I and Q alternating
 * @param lags how many, from 0; at most half of a block
 * @param points of a block, a power of two; at least one whole block of samples
 */
export function selfLikeness(samples: Float64Array, rateHz: number, lags: number, points: number): SelfLikeness {
  const blocks = Math.floor(samples.length / 2 / points);
  if (blocks < 1 || lags > points / 2)
    throw new RangeError(`selfLikeness: a block and up to half of it, got ${blocks} blocks, ${lags} lags`);
  const fft = createFft(2 * points);
  const data = new Float64Array(4 * points);
  const lines = new Float64Array(4 * points);
  const power = new Float64Array(4 * points);
  for (let block = 0; block < blocks; block++) {
    data.set(samples.subarray(2 * block * points, 2 * (block + 1) * points));
    fft.transform(lines, data);
    for (let n = 0; n < lines.length; n += 2) power[n] += lines[n] * lines[n] + lines[n + 1] * lines[n + 1];
  }
  fft.inverseTransform(lines, power);
  const magnitude = Float64Array.from({ length: lags }, (_, lag) => {
    const [re, im] = [lines[2 * lag], lines[2 * lag + 1]];
    return Math.sqrt(re * re + im * im) / (blocks * (points - lag));
  });
  return { stepS: 1 / rateHz, magnitude };
}
