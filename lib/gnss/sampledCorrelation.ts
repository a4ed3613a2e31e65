import { createDft } from "@/lib/numeric/dft";
import { timesConjugate } from "./exactCorrelation";

/**
 * Circular correlation of sampled signals, R[k] = 1/N sum over n of a[n] * b[(n + k) mod N], by transforms of their true
 * length (see `createDft`). With a band, a is what came through an ideal front end: only its lines up to half the bandwidth
 * on both sides of the carrier are kept. A replica stays unfiltered, as in a receiver.
 * @param a samples of a whole number of code periods, length N >= 2
 * @param b samples, length N
 * @param band two-sided bandwidth of the front end, at the rate of the samples
 */
export function sampledCorrelation(
  a: ArrayLike<number>,
  b: ArrayLike<number>,
  band?: { rateHz: number; bandwidthHz: number },
): Float64Array {
  const length = a.length;
  if (length < 2 || b.length !== length)
    throw new RangeError(`sampledCorrelation: equal lengths from 2, got ${a.length}, ${b.length}`);
  if (band && !(band.bandwidthHz > 0 && band.rateHz > 0))
    throw new RangeError(`sampledCorrelation: a bandwidth above 0 Hz, got ${band.bandwidthHz}`);
  const dft = createDft(length);
  const [linesA, linesB] = [a, b].map((samples) => {
    const complex = new Float64Array(2 * length);
    for (let n = 0; n < length; n++) complex[2 * n] = samples[n];
    const lines = new Float64Array(2 * length);
    dft.transform(lines, complex);
    return lines;
  });
  if (band) keepLines(linesA, (band.bandwidthHz / 2 / band.rateHz) * length);
  const lags = new Float64Array(2 * length);
  timesConjugate(linesA, linesA, linesB);
  dft.transform(lags, linesA);
  return Float64Array.from({ length }, (_, k) => lags[2 * k] / length / length);
}

/** Clears the lines above a place, which need not be whole; line N - k is line -k. */
function keepLines(lines: Float64Array, highest: number): void {
  const length = lines.length / 2;
  for (let k = 0; k < length; k++) if (Math.min(k, length - k) > highest) lines.fill(0, 2 * k, 2 * k + 2);
}
