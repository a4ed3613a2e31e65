import { cosTurns, sinTurns } from "./elementary";
import { createFft } from "./fft";

/** Discrete Fourier transform of one fixed length; real and imaginary parts alternate. */
export type Dft = { readonly length: number; transform(out: Float64Array, data: Float64Array): void };

const made = new Map<number, Dft>();
const MOST_KEPT = 16; // lengths; uploaded captures come at any rate, and each length holds tables of up to a megabyte

/**
 * Exact transform of any length N: out[k] = sum of data[n] exp(-2 pi i k n / N), not normalised. Code lengths such as 1023
 * and sample counts such as 2046 or 4092 per millisecond are no powers of two, so the sum is rewritten as a convolution
 * with a chirp (k n = (k^2 + n^2 - (k-n)^2)/2) and done by transforms of the next power of two from 2N - 1:
 * Bluestein, "A linear filtering approach to the computation of discrete Fourier transform" (1970). No interpolation.
 */
export function createDft(length: number): Dft {
  const known = made.get(length);
  if (known) return known;
  if (!Number.isInteger(length) || length < 2) throw new RangeError(`createDft: whole length from 2, got ${length}`);
  let size = 4;
  while (size < 2 * length - 1) size *= 2;
  const fft = createFft(size);
  const chirp = chirpOf(length);
  const filter = filterSpectrum(chirp, length, size);
  const padded = new Float64Array(2 * size);
  const spectrum = new Float64Array(2 * size);

  const transform = (out: Float64Array, data: Float64Array) => {
    padded.fill(0);
    timesChirp(padded, data, chirp, length);
    fft.transform(spectrum, padded);
    for (let n = 0; n < 2 * size; n += 2) {
      const re = spectrum[n] * filter[n] - spectrum[n + 1] * filter[n + 1];
      spectrum[n + 1] = spectrum[n] * filter[n + 1] + spectrum[n + 1] * filter[n];
      spectrum[n] = re;
    }
    fft.inverseTransform(padded, spectrum);
    timesChirp(out, padded, chirp, length);
  };
  const dft = { length, transform };
  if (made.size >= MOST_KEPT) made.clear();
  made.set(length, dft);
  return dft;
}

/** exp(-i pi n^2 / N), n from 0 to N - 1; the phase is counted in whole 1/(2N) turns. */
function chirpOf(length: number): Float64Array {
  const chirp = new Float64Array(2 * length);
  for (let n = 0; n < length; n++) {
    const turns = ((n * n) % (2 * length)) / (2 * length);
    chirp[2 * n] = cosTurns(turns);
    chirp[2 * n + 1] = -sinTurns(turns);
  }
  return chirp;
}

function filterSpectrum(chirp: Float64Array, length: number, size: number): Float64Array {
  const filter = new Float64Array(2 * size);
  for (let n = 0; n < length; n++) {
    for (const at of n === 0 ? [0] : [n, size - n]) {
      filter[2 * at] = chirp[2 * n];
      filter[2 * at + 1] = -chirp[2 * n + 1];
    }
  }
  const spectrum = new Float64Array(2 * size);
  createFft(size).transform(spectrum, filter);
  return spectrum;
}

function timesChirp(out: Float64Array, data: Float64Array, chirp: Float64Array, length: number): void {
  for (let n = 0; n < 2 * length; n += 2) {
    const re = data[n] * chirp[n] - data[n + 1] * chirp[n + 1];
    out[n + 1] = data[n] * chirp[n + 1] + data[n + 1] * chirp[n];
    out[n] = re;
  }
}
