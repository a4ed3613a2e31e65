/** Chips of a spreading code, +1 for logic 0 and -1 for logic 1. */
export type Chips = Int8Array;

/** Logic levels 0 or 1. */
export type Levels = Uint8Array;

/**
 * Output of a Fibonacci shift register over one period of 2^n - 1 steps: all-ones start, feedback into stage 1, the last
 * stage comes out. Maximal length when the polynomial is primitive.
 * @param polynomial bit k is the coefficient of x^k, both end terms included: 1 + x^3 + x^10 is 0o2011; coefficient k > 0
 *   is a tap on stage k
 */
export function registerSequence(polynomial: number): Levels {
  const stages = stagesOf(polynomial);
  return registerOutput(polynomial, 1 << (stages - 1));
}

/**
 * The same register read at several stages at once.
 * @param selected bit k - 1 set: stage k is added (modulo 2) to the output
 */
export function registerOutput(polynomial: number, selected: number): Levels {
  const stages = stagesOf(polynomial);
  const taps = polynomial >> 1;
  const levels = new Uint8Array((1 << stages) - 1);
  let state = levels.length; // all ones
  for (let n = 0; n < levels.length; n++) {
    levels[n] = parity(state & selected);
    state = stepRegister(state, taps, stages);
  }
  return levels;
}

/**
 * The register from any start, cut short or run on: `length` levels out of the last stage.
 * @param start content, stage 1 in bit 0
 */
export function registerRun(polynomial: number, start: number, length: number): Levels {
  const stages = stagesOf(polynomial);
  if (!Number.isInteger(start) || start <= 0 || start >= 1 << stages)
    throw new RangeError(`registerRun: start that is not all zeros, ${stages} stages, got ${start}`);
  const taps = polynomial >> 1;
  const levels = new Uint8Array(length);
  let state = start;
  for (let n = 0; n < length; n++) {
    levels[n] = state >> (stages - 1);
    state = stepRegister(state, taps, stages);
  }
  return levels;
}

/** One step, stage 1 in bit 0: everything moves up, the tapped sum enters stage 1. */
export const stepRegister = (state: number, taps: number, stages: number): number =>
  ((state << 1) | parity(state & taps)) & ((1 << stages) - 1);

/** +1 for logic 0, -1 for logic 1. */
export const chipsOf = (levels: Levels): Chips => Int8Array.from(levels, (level) => 1 - 2 * level);

/** The inverse of `chipsOf`. */
export const levelsOf = (chips: Chips): Levels => Uint8Array.from(chips, (chip) => (1 - chip) >> 1);

function stagesOf(polynomial: number): number {
  const stages = 31 - Math.clz32(polynomial);
  if (!Number.isInteger(polynomial) || polynomial % 2 !== 1 || stages < 2 || stages > 20)
    throw new RangeError(`registerSequence: polynomial with both end terms, 2 to 20 stages, got ${polynomial}`);
  return stages;
}

function parity(word: number): number {
  let bits = word;
  for (let shift = 16; shift > 0; shift >>= 1) bits ^= bits >>> shift;
  return bits & 1;
}
