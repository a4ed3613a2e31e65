/** Bits of the ten words of a subframe and of one word. */
export const SUBFRAME_BITS = 300;
const WORD_BITS = 30;
const DATA_BITS = 24;

/** First bits of each subframe, 1000 1011. IS-GPS-200, 20.3.3.1. */
const PREAMBLE = [1, 0, 0, 0, 1, 0, 1, 1] as const;

/**
 * Which data bits enter each parity bit, counted from 1, and which of the last two bits of the word before: D29* or
 * D30*. IS-GPS-200, Table 20-XIV.
 */
// prettier-ignore
const PARITY: ReadonlyArray<{ before: 29 | 30; bits: readonly number[] }> = [
  { before: 29, bits: [1, 2, 3, 5, 6, 10, 11, 12, 13, 14, 17, 18, 20, 23] },
  { before: 30, bits: [2, 3, 4, 6, 7, 11, 12, 13, 14, 15, 18, 19, 21, 24] },
  { before: 29, bits: [1, 3, 4, 5, 7, 8, 12, 13, 14, 15, 16, 19, 20, 22] },
  { before: 30, bits: [2, 4, 5, 6, 8, 9, 13, 14, 15, 16, 17, 20, 21, 23] },
  { before: 30, bits: [1, 3, 5, 6, 7, 9, 10, 14, 15, 16, 17, 18, 21, 22, 24] },
  { before: 29, bits: [3, 5, 6, 8, 9, 10, 11, 13, 15, 19, 22, 23, 24] },
];

/** Last two bits, as sent, of the word before. */
export type BitsBefore = readonly [d29: number, d30: number];

/**
 * The six parity bits that belong to 24 data bits. IS-GPS-200, Table 20-XIV.
 * @param data bits 1 to 24 before any inversion
 */
export const parityBits = (data: ArrayLike<number>, [d29, d30]: BitsBefore): number[] =>
  PARITY.map(({ before, bits }) => bits.reduce((sum, bit) => sum ^ data[bit - 1], before === 29 ? d29 : d30));

/** A word as it is sent: data bits turned over when D30* is 1, parity behind. IS-GPS-200, 20.3.5.2. */
export const encodeWord = (data: ArrayLike<number>, before: BitsBefore): number[] => [
  ...Array.from({ length: DATA_BITS }, (_, n) => data[n] ^ before[1]),
  ...parityBits(data, before),
];

/** Data bits of a word as received, or null when its parity fails. IS-GPS-200, 20.3.5.2, Figure 20-5. */
export function decodeWord(word: ArrayLike<number>, before: BitsBefore): number[] | null {
  const data = Array.from({ length: DATA_BITS }, (_, n) => word[n] ^ before[1]);
  const parity = parityBits(data, before);
  return parity.every((bit, n) => bit === word[DATA_BITS + n]) ? data : null;
}

/**
 * Data bits of the ten words of a subframe, 24 each.
 * @param bits 300 as received, first bit first, upright or turned over as a whole: a Costas loop cannot tell
 * @returns null for a word whose parity fails, or for all ten when the preamble is not there. The two bits before the
 *   first word are 0, for the tenth word always ends so (20.3.5.2); the preamble says whether all bits are turned over
 */
export function decodeSubframe(bits: ArrayLike<number>): (number[] | null)[] {
  if (bits.length !== SUBFRAME_BITS) throw new RangeError(`decodeSubframe: ${SUBFRAME_BITS} bits, got ${bits.length}`);
  const turned = preambleAt(bits, 0);
  if (turned === null) return Array.from({ length: 10 }, () => null);
  const upright = Array.from(bits, (bit) => bit ^ turned);
  let before: BitsBefore = [0, 0];
  return Array.from({ length: 10 }, (_, n) => {
    const word = upright.slice(n * WORD_BITS, (n + 1) * WORD_BITS);
    const data = decodeWord(word, before);
    before = [word[28], word[29]];
    return data;
  });
}

/** Whether a preamble stands at a bit: 0 upright, 1 turned over, null for none. */
export function preambleAt(bits: ArrayLike<number>, at: number): 0 | 1 | null {
  const turned = bits[at] ^ PREAMBLE[0];
  return PREAMBLE.every((bit, n) => (bits[at + n] ^ turned) === bit) ? (turned as 0 | 1) : null;
}
