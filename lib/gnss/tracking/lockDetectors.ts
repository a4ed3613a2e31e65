/**
 * Phase-lock indicator per block of prompts: (I^2 - Q^2)/(I^2 + Q^2) of the block's sum, the cosine of twice the phase
 * error: 1 in lock, about 0 with none. Van Dierendonck, in Parkinson & Spilker, "Global Positioning System: Theory and
 * Applications" I (1996), 8.
 * @param prompts complex sums, real and imaginary parts alternating
 * @param first sum to begin with, a bit edge
 * @param perBlock sums in a block, inside a data bit
 */
export function phaseLockIndicators(prompts: ArrayLike<number>, first: number, perBlock: number): Float64Array {
  const blocks = Math.max(0, Math.floor((prompts.length / 2 - first) / perBlock));
  return Float64Array.from({ length: blocks }, (_, block) => {
    let [re, im] = [0, 0];
    for (let n = first + block * perBlock; n < first + (block + 1) * perBlock; n++) {
      re += prompts[2 * n];
      im += prompts[2 * n + 1];
    }
    const power = re * re + im * im;
    return power > 0 ? (re * re - im * im) / power : 0;
  });
}

/** When a lock is declared and given up. */
export type LockRule = {
  /** Indicator that counts as in lock. */
  threshold: number;
  /** Indicators in a row, smoothed, to declare lock. */
  toDeclare: number;
  /** Indicators in a row below to give it up. */
  toGiveUp: number;
  /** Weight of a new indicator in the running mean, above 0 up to 1. */
  weight: number;
};

/** 26 degrees of phase error, half a second to declare or give up in blocks of 20 ms. Common practice, no source. */
export const USUAL_LOCK_RULE: LockRule = { threshold: 0.6, toDeclare: 25, toGiveUp: 25, weight: 0.1 };

/**
 * Lock over time from indicators: a running mean passes the threshold so many times in a row before the state changes,
 * so that neither one good block declares lock nor one bad block gives it up.
 * @returns one state for each indicator
 */
export function lockStates(indicators: ArrayLike<number>, rule: LockRule = USUAL_LOCK_RULE): boolean[] {
  if (!(rule.weight > 0 && rule.weight <= 1))
    throw new RangeError(`lockStates: weight above 0 up to 1, got ${rule.weight}`);
  let locked = false;
  let inARow = 0;
  let smooth = 0;
  return Array.from(indicators, (indicator) => {
    smooth += rule.weight * (indicator - smooth);
    const differs = smooth >= rule.threshold !== locked;
    inARow = differs ? inARow + 1 : 0;
    if (inARow >= (locked ? rule.toGiveUp : rule.toDeclare)) {
      locked = !locked;
      inARow = 0;
    }
    return locked;
  });
}
