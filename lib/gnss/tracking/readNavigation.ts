import { decodeSubframe, preambleAt, SUBFRAME_BITS } from "./navigationWords";

/** What one subframe says about time. */
export type SubframeTime = {
  /** Bit at which it begins. */
  firstBit: number;
  /** 1 to 5. */
  subframe: number;
  /** Time of week in s at the first bit of this subframe; the hand-over word names the next one. */
  timeOfWeekS: number;
  /** Ten bits of subframe 1; null in the others or when that word failed. */
  week: number | null;
  /** Words whose parity held, of ten. */
  goodWords: number;
};

const SUBFRAME_S = 6;
const WEEK_S = 604_800;
const WEEKS_OF_TEN_BITS = 1024;
const HAND_OVER_WORD = 1;

/**
 * Time from the bits of GPS L1 C/A: each place with a preamble whose telemetry and hand-over words pass their parity,
 * whose subframe number is 1 to 5 and whose time of week fits. IS-GPS-200, 20.3.3.1 to 20.3.3.3. Twelve and more parity
 * bits and the preamble leave one wrong place in about a million bits; a second subframe 6 s later settles it.
 * @param bits 0 or 1 each; whole subframes are read, what is left over at the end is not
 */
export function readNavigation(bits: ArrayLike<number>): SubframeTime[] {
  const found: SubframeTime[] = [];
  for (let at = 0; at + SUBFRAME_BITS <= bits.length; at++) {
    if (preambleAt(bits, at) === null) continue;
    const words = decodeSubframe(Array.from({ length: SUBFRAME_BITS }, (_, n) => bits[at + n]));
    const [telemetry, handOver] = words;
    if (!telemetry || !handOver) continue;
    const count = numberOf(handOver, 1, 17);
    const subframe = numberOf(handOver, 20, 3);
    if (subframe < 1 || subframe > 5 || count * SUBFRAME_S >= WEEK_S) continue;
    found.push({
      firstBit: at,
      subframe,
      timeOfWeekS: (count * SUBFRAME_S - SUBFRAME_S + WEEK_S) % WEEK_S,
      week: subframe === 1 && words[HAND_OVER_WORD + 1] ? numberOf(words[HAND_OVER_WORD + 1]!, 1, 10) : null,
      goodWords: words.filter((word) => word !== null).length,
    });
  }
  return found;
}

/**
 * Whole GPS week of a ten-bit week number: the first such week that is not before a known one. IS-GPS-200,
 * 20.3.3.3.1.1: the number starts again every 1024 weeks.
 * @param notBefore a week that has surely begun, such as that of the software
 */
export const wholeWeek = (tenBits: number, notBefore: number): number =>
  notBefore + ((((tenBits - notBefore) % WEEKS_OF_TEN_BITS) + WEEKS_OF_TEN_BITS) % WEEKS_OF_TEN_BITS);

/**
 * Data bits from the prompts of code periods: the sign of the sum over each bit, 0 for above 0. The loop must be in
 * phase lock.
 * @param prompts complex sums, real and imaginary parts alternating
 * @param edge code period at which a bit begins
 */
export function bitsOfPrompts(prompts: ArrayLike<number>, edge: number, periodsPerBit = 20): Uint8Array {
  const bits = Math.max(0, Math.floor((prompts.length / 2 - edge) / periodsPerBit));
  return Uint8Array.from({ length: bits }, (_, bit) => {
    let sum = 0;
    for (let n = 0; n < periodsPerBit; n++) sum += prompts[2 * (edge + bit * periodsPerBit + n)];
    return sum > 0 ? 0 : 1;
  });
}

/** Whole number of some bits of a word, counted from 1, most significant first. */
function numberOf(word: readonly number[], first: number, count: number): number {
  let value = 0;
  for (let n = 0; n < count; n++) value = 2 * value + word[first - 1 + n];
  return value;
}
