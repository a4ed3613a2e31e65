import { createFft } from "@/lib/numeric/fft";
import { timesConjugate, transformSize } from "./exactCorrelation";
import type { Chips } from "./shiftRegister";

const MANTISSA_BITS = 52;
/** Bits kept free above the rounding of the transforms, which grows with the highest digit. */
const SPARE_BITS = 8;
const CLEAR = 0.25; // as in `exactCorrelation`
const LAST_BIT_IS_ONE = 6_755_399_441_055_744; // 1.5 * 2^52

/**
 * Periodic correlations of every code of a set with every other, itself included, in whole numbers: the sum over n of
 * c_i[n] * c_j[(n + k) mod N] stands at (i * M + j) * N + k.
 *
 * One transform serves up to eight pairs. Two codes i stand as the real and the imaginary part of one signal; some codes j,
 * weighted by 1, B, B^2 ..., are summed up in the other. The correlation of the two then holds those of all the pairs as
 * digits to the base B, which is large enough for every value from -N to N. Adding a large constant brings the digits
 * into known bits of the number, where they are read off; a rounding that is not clear throws. The pair (j, i) is the pair
 * (i, j) with its lags reversed.
 * How a length of 1023 gets along with transforms of powers of two: see `exactCorrelation`.
 * @param codes M codes, M >= 1, +1 or -1, all of length N, 2 to 16,383
 * @param result where to write, M * M * N values; fresh memory takes longer than the sums when this is done again and again
 */
export function allCorrelations(
  codes: readonly Chips[],
  result = new Int16Array(codes.length * codes.length * (codes[0]?.length ?? 0)),
): Int16Array {
  const count = codes.length;
  const length = codes[0]?.length ?? 0;
  if (length < 2 || length > 16_383 || codes.some((code) => code.length !== length))
    throw new RangeError(`allCorrelations: one length from 2 to 16383, got ${codes.map((code) => code.length).join()}`);
  if (result.length !== count * count * length)
    throw new RangeError(`allCorrelations: ${count * count * length} places for the result, got ${result.length}`);
  const size = transformSize(length);
  const fft = createFft(size);
  const bits = 32 - Math.clz32(2 * length); // a digit from -N to N
  const digits = Math.floor((MANTISSA_BITS - SPARE_BITS) / bits);
  const blocks = blockSpectra(codes, digits, 1 << bits, size);
  const [padded, pair, product, lags] = Array.from({ length: 4 }, () => new Float64Array(2 * size));
  const words = new Int32Array(lags.buffer);
  for (let even = 0; even < count; even += 2) {
    const last = Math.min(even + 1, count - 1);
    for (let n = 0; n < length; n++) {
      padded[2 * n] = codes[even][n];
      padded[2 * n + 1] = codes[last][n]; // the last code of an odd number stands twice
    }
    fft.transform(pair, padded);
    for (let block = Math.floor(even / digits); block < blocks.length; block++) {
      timesConjugate(product, pair, blocks[block]);
      fft.transform(lags, product);
      placeDigits(lags, length, bits, digits);
      const first = block * digits;
      for (let i = even; i <= last; i++)
        for (let j = Math.max(i, first); j < Math.min(first + digits, count); j++) {
          const rows = { row: i * count + j, mirrored: j * count + i, length };
          readDigit(result, words, rows, { word: 2 * (i - even), shift: bits * (j - first), bits });
        }
    }
  }
  return result;
}

/** Spectra of weighted sums of so many codes each, laid down twice in a row: see `exactCorrelation`. */
function blockSpectra(codes: readonly Chips[], digits: number, base: number, size: number): Float64Array[] {
  const twice = new Float64Array(2 * size);
  const length = codes[0].length;
  return Array.from({ length: Math.ceil(codes.length / digits) }, (_, block) => {
    twice.fill(0);
    let weight = 1 / size;
    for (const code of codes.slice(block * digits, (block + 1) * digits)) {
      for (let n = 0; n < length; n++) twice[2 * n] += weight * code[n];
      weight *= base;
    }
    twice.copyWithin(2 * length, 0, 2 * length - 2);
    const spectrum = new Float64Array(2 * size);
    createFft(size).transform(spectrum, twice);
    return spectrum;
  });
}

/**
 * Adds to every lag a constant that makes its last bit count 1, and half the base to every digit, so that none is
 * negative: the digits now lie in the low bits of the number.
 */
function placeDigits(lags: Float64Array, length: number, bits: number, digits: number): void {
  let constant = LAST_BIT_IS_ONE;
  let weight = 1 << (bits - 1);
  for (let digit = 0; digit < digits; digit++) {
    constant += weight;
    weight *= 1 << bits;
  }
  let unclear = 0;
  for (let n = 0; n < 2 * length; n++) {
    const fixed = lags[n] + constant;
    unclear = Math.max(unclear, Math.abs(fixed - constant - lags[n]));
    lags[n] = fixed;
  }
  if (!(unclear < CLEAR)) throw new RangeError(`allCorrelations: ${unclear} off a whole number, codes too long`);
}

/**
 * Copies one digit of all lags into a row of the result, and with the lags reversed into another.
 * @param words the lags as words of 32 bits, the lower one of each number first, as all machines in use have it
 */
function readDigit(
  result: Int16Array,
  words: Int32Array,
  { row, mirrored, length }: { row: number; mirrored: number; length: number },
  { word, shift, bits }: { word: number; shift: number; bits: number },
): void {
  const mask = (1 << bits) - 1;
  const half = 1 << (bits - 1);
  // A digit may lie across both words; where it does not, 31 keeps the higher one out of the mask.
  const low = word + (shift >> 5);
  const high = word + 1;
  const down = shift & 31;
  const up = shift > 0 && shift < 32 ? 32 - shift : 31;
  const forth = row * length;
  const back = (mirrored + 1) * length;
  let at = back - length;
  for (let k = 0; k < length; k++) {
    const value = (((words[4 * k + low] >>> down) | (words[4 * k + high] << up)) & mask) - half;
    result[forth + k] = value;
    result[at] = value;
    at = back - k - 1;
  }
}
