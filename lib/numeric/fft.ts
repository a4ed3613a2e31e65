import FFT from "fft.js";
import { cosTurns, sinTurns } from "./elementary";

/** Complex Fourier transform of one fixed size; real and imaginary parts alternate, so arrays have 2 * size numbers. */
export type Fft = {
  readonly size: number;
  /** out[k] = sum of data[n] exp(-2 pi i k n / size), not normalised; `out` and `data` must differ. */
  transform(out: Float64Array, data: Float64Array): void;
  /** The inverse, divided by size. */
  inverseTransform(out: Float64Array, data: Float64Array): void;
};

const made = new Map<number, Fft>();

/**
 * Transform of a power-of-two size (>= 4). The package fills its table of twiddle factors with the engine's own sine and
 * cosine, which may differ between engines in the last digit; ours replaces it.
 */
export function createFft(size: number): Fft {
  const known = made.get(size);
  if (known) return known;
  if (!Number.isInteger(size) || size < 4 || (size & (size - 1)) !== 0)
    throw new RangeError(`createFft: size must be a power of two from 4, got ${size}`);
  const fft = new FFT(size);
  const table = new Float64Array(2 * size);
  for (let n = 0; n < size; n++) {
    table[2 * n] = cosTurns(n / size);
    table[2 * n + 1] = -sinTurns(n / size);
  }
  fft.table = table;
  made.set(size, fft);
  return fft;
}
