import { chacha20Blocks } from "./chacha20";
import { normalDraw } from "./ziggurat";

/** A stream of random draws; the same seed and stream name give the same draws everywhere. */
export type Random = {
  /** In [0, 1), all 53 bits. */
  uniform(): number;
  /** Whole number from `from` to `to`, both included, without bias; the span is at most 2^32. */
  integer(from: number, to: number): number;
  /** Mean 0, standard deviation 1. */
  gaussian(): number;
  pick<T>(list: readonly T[]): T;
  /** A new list in random order. */
  shuffle<T>(list: readonly T[]): T[];
};

const BUFFER_WORDS = 1024;

/**
 * Random draws from a ChaCha20 keystream (RFC 8439). The stream name becomes the nonce, so that one more draw in one
 * stream moves nothing in another.
 * @param seedHex 64 hexadecimal digits, the key
 * @param stream name of the use, such as "noise"
 */
export function seededRandom(seedHex: string, stream: string): Random {
  const word = keystream(keyOf(seedHex), nonceOf(stream));
  const uniform = () => ((word() >>> 5) * 0x4000000 + (word() >>> 6)) / 0x20000000000000;
  const integer = (from: number, to: number) => {
    const span = to - from + 1;
    if (!Number.isInteger(from) || !(span >= 1 && span <= 0x100000000))
      throw new RangeError(`Random.integer: whole numbers in order, span up to 2^32, got ${from} to ${to}`);
    const limit = 0x100000000 - (0x100000000 % span); // what lies above would favour the first numbers
    for (;;) {
      const draw = word() >>> 0;
      if (draw < limit) return from + (draw % span);
    }
  };
  const shuffle = <T>(list: readonly T[]): T[] => {
    const mixed = [...list];
    for (let n = mixed.length - 1; n > 0; n--) {
      const other = integer(0, n);
      [mixed[n], mixed[other]] = [mixed[other], mixed[n]];
    }
    return mixed;
  };
  return {
    uniform,
    integer,
    gaussian: () => normalDraw(word),
    pick: (list) => list[integer(0, list.length - 1)],
    shuffle,
  };
}

function keystream(key: Uint32Array, nonce: Uint32Array): () => number {
  const buffer = new Uint32Array(BUFFER_WORDS);
  let position = BUFFER_WORDS;
  let counter = 0;
  return () => {
    if (position === BUFFER_WORDS) {
      if (counter >= 0x100000000) throw new RangeError("seededRandom: the stream's 2^32 blocks are used up");
      chacha20Blocks(key, counter, nonce, buffer);
      counter += BUFFER_WORDS / 16;
      position = 0;
    }
    return buffer[position++] | 0;
  };
}

function keyOf(seedHex: string): Uint32Array {
  if (!/^[0-9a-f]{64}$/i.test(seedHex))
    throw new RangeError(`seededRandom: seed of 64 hex digits, got ${seedHex.length} characters`);
  const bytes = Array.from({ length: 32 }, (_, n) => Number.parseInt(seedHex.slice(2 * n, 2 * n + 2), 16));
  return Uint32Array.from(
    { length: 8 },
    (_, n) => (bytes[4 * n] | (bytes[4 * n + 1] << 8) | (bytes[4 * n + 2] << 16) | (bytes[4 * n + 3] << 24)) >>> 0,
  );
}

/** Three 32-bit FNV-1a hashes of the name (draft-eastlake-fnv, section 2), told apart by their number fed in first. */
function nonceOf(stream: string): Uint32Array {
  return Uint32Array.from([0, 1, 2], (part) => {
    let hash = Math.imul(0x811c9dc5 ^ part, 0x01000193);
    for (let n = 0; n < stream.length; n++) {
      const unit = stream.charCodeAt(n);
      hash = Math.imul(hash ^ (unit & 255), 0x01000193);
      hash = Math.imul(hash ^ (unit >>> 8), 0x01000193);
    }
    return hash >>> 0;
  });
}
