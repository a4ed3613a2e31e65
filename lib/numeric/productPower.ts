import { cosTurns, sinTurns } from "./elementary";

/** Powers of the transform of a product of two spectra, for one fixed size; complex data alternate real and imaginary part. */
export type ProductPower = {
  readonly size: number;
  /**
   * out[p] += |sum over n of a[n] b[n] exp(-2 pi i k n / size)|^2 with k = places[p]. `out` has `size` numbers, `a` and `b`
   * twice as many.
   */
  add(out: Float64Array, a: Float64Array, b: Float64Array): void;
  /** Which k stands at which place of `out`. */
  readonly places: Uint32Array;
};

const SQRT_HALF = Math.SQRT1_2;
const made = new Map<number, ProductPower>();

/**
 * The innermost step of a code search, where only the powers are wanted. The powers stay in the order in which decimation in
 * frequency leaves them, so that nothing is sorted, and butterflies of eight halve the walks through memory: half the time of
 * product, general transform and powers one after the other. Method: Gentleman & Sande, "Fast Fourier Transforms - For Fun
 * and Profit" (1966).
 * @param size power of two from 16
 */
export function createProductPower(size: number): ProductPower {
  const known = made.get(size);
  if (known) return known;
  if (!Number.isInteger(size) || size < 16 || (size & (size - 1)) !== 0)
    throw new RangeError(`createProductPower: size must be a power of two from 16, got ${size}`);
  const radices = radicesOf(size);
  const passes: { radix: number; stride: number; turns: Float64Array }[] = [];
  let block = size;
  for (const radix of radices.slice(0, -1)) {
    passes.push({ radix, stride: (2 * block) / radix, turns: turnsOf(block, radix) });
    block /= radix;
  }
  const work = new Float64Array(2 * size);
  const add = (out: Float64Array, a: Float64Array, b: Float64Array) => {
    multiply(work, a, b);
    for (const { radix, stride, turns } of passes) {
      if (radix === 8) eights(work, turns, stride);
      else fours(work, turns, stride);
    }
    addLastFours(out, work);
  };
  const productPower = { size, add, places: placesOf(size, radices) };
  made.set(size, productPower);
  return productPower;
}

/** Eights as far as possible, fours for the rest; the last is a four. */
function radicesOf(size: number): number[] {
  let rest = size / 4;
  const radices: number[] = [];
  for (; rest >= 8 && rest !== 16; rest /= 8) radices.push(8);
  for (; rest >= 4; rest /= 4) radices.push(4);
  return [...radices, 4];
}

/** Twiddle factors of one pass in the order of use: exp(-2 pi i j q / block), q from 1. */
function turnsOf(block: number, radix: number): Float64Array {
  const turns = new Float64Array((2 * block * (radix - 1)) / radix);
  let at = 0;
  for (let j = 0; j < block / radix; j++) {
    for (let q = 1; q < radix; q++) {
      turns[at++] = cosTurns((j * q) / block);
      turns[at++] = -sinTurns((j * q) / block);
    }
  }
  return turns;
}

function placesOf(size: number, radices: readonly number[]): Uint32Array {
  return Uint32Array.from({ length: size }, (_, place) => {
    let k = 0;
    let weight = 1;
    let block = size;
    let rest = place;
    for (const radix of radices) {
      block /= radix;
      const digit = Math.floor(rest / block);
      rest -= digit * block;
      k += digit * weight;
      weight *= radix;
    }
    return k;
  });
}

function multiply(out: Float64Array, a: Float64Array, b: Float64Array): void {
  for (let n = 0; n < out.length; n += 2) {
    const re = a[n];
    const im = a[n + 1];
    const c = b[n];
    const s = b[n + 1];
    out[n] = re * c - im * s;
    out[n + 1] = re * s + im * c;
  }
}

/** Butterflies of eight in place. Written out: an array of the eight values would cost three times the time. */
function eights(w: Float64Array, t: Float64Array, s: number): void {
  for (let from = 0; from < w.length; from += 8 * s) {
    let k = 0;
    for (let j = from; j < from + s; j += 2) {
      const j1 = j + s;
      const j2 = j1 + s;
      const j3 = j2 + s;
      const j4 = j3 + s;
      const j5 = j4 + s;
      const j6 = j5 + s;
      const j7 = j6 + s;
      // Sums and differences of opposite values: even outputs from a0 to a3, odd ones from a4 to a7.
      const a0r = w[j] + w[j4];
      const a0i = w[j + 1] + w[j4 + 1];
      const a4r = w[j] - w[j4];
      const a4i = w[j + 1] - w[j4 + 1];
      const a2r = w[j2] + w[j6];
      const a2i = w[j2 + 1] + w[j6 + 1];
      const a6r = w[j2] - w[j6];
      const a6i = w[j2 + 1] - w[j6 + 1];
      const b0r = a0r + a2r;
      const b0i = a0i + a2i;
      const b2r = a0r - a2r;
      const b2i = a0i - a2i;
      const d0r = a4r + a6i;
      const d0i = a4i - a6r;
      const d2r = a4r - a6i;
      const d2i = a4i + a6r;
      const a1r = w[j1] + w[j5];
      const a1i = w[j1 + 1] + w[j5 + 1];
      const a5r = w[j1] - w[j5];
      const a5i = w[j1 + 1] - w[j5 + 1];
      const a3r = w[j3] + w[j7];
      const a3i = w[j3 + 1] + w[j7 + 1];
      const a7r = w[j3] - w[j7];
      const a7i = w[j3 + 1] - w[j7 + 1];
      const b1r = a1r + a3r;
      const b1i = a1i + a3i;
      const b3r = a1r - a3r;
      const b3i = a1i - a3i;
      // a5 and a7 turned by an eighth and three eighths of a turn.
      const ur = a5r + a5i;
      const ui = a5i - a5r;
      const vr = a7i - a7r;
      const vi = -a7r - a7i;
      const d1r = SQRT_HALF * (ur + vr);
      const d1i = SQRT_HALF * (ui + vi);
      const d3r = SQRT_HALF * (ur - vr);
      const d3i = SQRT_HALF * (ui - vi);
      w[j] = b0r + b1r;
      w[j + 1] = b0i + b1i;
      let yr = d0r + d1r;
      let yi = d0i + d1i;
      w[j1] = yr * t[k] - yi * t[k + 1];
      w[j1 + 1] = yr * t[k + 1] + yi * t[k];
      yr = b2r + b3i;
      yi = b2i - b3r;
      w[j2] = yr * t[k + 2] - yi * t[k + 3];
      w[j2 + 1] = yr * t[k + 3] + yi * t[k + 2];
      yr = d2r + d3i;
      yi = d2i - d3r;
      w[j3] = yr * t[k + 4] - yi * t[k + 5];
      w[j3 + 1] = yr * t[k + 5] + yi * t[k + 4];
      yr = b0r - b1r;
      yi = b0i - b1i;
      w[j4] = yr * t[k + 6] - yi * t[k + 7];
      w[j4 + 1] = yr * t[k + 7] + yi * t[k + 6];
      yr = d0r - d1r;
      yi = d0i - d1i;
      w[j5] = yr * t[k + 8] - yi * t[k + 9];
      w[j5 + 1] = yr * t[k + 9] + yi * t[k + 8];
      yr = b2r - b3i;
      yi = b2i + b3r;
      w[j6] = yr * t[k + 10] - yi * t[k + 11];
      w[j6 + 1] = yr * t[k + 11] + yi * t[k + 10];
      yr = d2r - d3i;
      yi = d2i + d3r;
      w[j7] = yr * t[k + 12] - yi * t[k + 13];
      w[j7 + 1] = yr * t[k + 13] + yi * t[k + 12];
      k += 14;
    }
  }
}

function fours(w: Float64Array, t: Float64Array, s: number): void {
  for (let from = 0; from < w.length; from += 4 * s) {
    let k = 0;
    for (let j = from; j < from + s; j += 2) {
      const j1 = j + s;
      const j2 = j1 + s;
      const j3 = j2 + s;
      const ar = w[j] + w[j2];
      const ai = w[j + 1] + w[j2 + 1];
      const br = w[j] - w[j2];
      const bi = w[j + 1] - w[j2 + 1];
      const cr = w[j1] + w[j3];
      const ci = w[j1 + 1] + w[j3 + 1];
      const dr = w[j1] - w[j3];
      const di = w[j1 + 1] - w[j3 + 1];
      w[j] = ar + cr;
      w[j + 1] = ai + ci;
      let yr = br + di;
      let yi = bi - dr;
      w[j1] = yr * t[k] - yi * t[k + 1];
      w[j1 + 1] = yr * t[k + 1] + yi * t[k];
      yr = ar - cr;
      yi = ai - ci;
      w[j2] = yr * t[k + 2] - yi * t[k + 3];
      w[j2 + 1] = yr * t[k + 3] + yi * t[k + 2];
      yr = br - di;
      yi = bi + dr;
      w[j3] = yr * t[k + 4] - yi * t[k + 5];
      w[j3 + 1] = yr * t[k + 5] + yi * t[k + 4];
      k += 6;
    }
  }
}

/** The last butterflies need no twiddle factors; their powers are added up at once. */
function addLastFours(out: Float64Array, w: Float64Array): void {
  let j = 0;
  for (let p = 0; p < out.length; p += 4) {
    const ar = w[j] + w[j + 4];
    const ai = w[j + 1] + w[j + 5];
    const br = w[j] - w[j + 4];
    const bi = w[j + 1] - w[j + 5];
    const cr = w[j + 2] + w[j + 6];
    const ci = w[j + 3] + w[j + 7];
    const dr = w[j + 2] - w[j + 6];
    const di = w[j + 3] - w[j + 7];
    out[p] += (ar + cr) * (ar + cr) + (ai + ci) * (ai + ci);
    out[p + 1] += (br + di) * (br + di) + (bi - dr) * (bi - dr);
    out[p + 2] += (ar - cr) * (ar - cr) + (ai - ci) * (ai - ci);
    out[p + 3] += (br - di) * (br - di) + (bi + dr) * (bi + dr);
    j += 8;
  }
}
