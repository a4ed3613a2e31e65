/** A band that must stay free. */
export type Band = { lowHz: number; highHz: number };

/** One product of transmitters that falls into a band. */
export type MixProduct = {
  /**
   * Multiplier of each transmitter, in the order of the list; the sum of times multiplier and frequency is the product.
   */
  multipliers: number[];
  /** Sum of the multipliers' magnitudes. */
  order: number;
  frequencyHz: number;
  /** From the middle of the band. */
  offsetHz: number;
};

const MOST_TRANSMITTERS_IN_A_MIX = 3;

/**
 * Harmonics and mixes of transmitters that fall into a band: all sums of whole multiples, of up to three transmitters
 * at a time, whose magnitudes add up to at most `highestOrder`. Arithmetic; which of them are strong is another
 * question, the lower order as a rule.
 * @param frequenciesHz of the transmitters, at most 12
 * @returns by order, then by distance from the band's middle
 */
export function mixProducts(frequenciesHz: readonly number[], highestOrder: number, band: Band): MixProduct[] {
  if (!(frequenciesHz.length <= 12 && frequenciesHz.every((frequency) => frequency > 0)))
    throw new RangeError(`mixProducts: up to 12 frequencies above 0 Hz, got ${frequenciesHz.join(", ")}`);
  if (!(Number.isInteger(highestOrder) && highestOrder >= 1 && highestOrder <= 15))
    throw new RangeError(`mixProducts: order of 1 to 15, got ${highestOrder}`);
  const middleHz = (band.lowHz + band.highHz) / 2;
  const found: MixProduct[] = [];
  const multipliers = frequenciesHz.map(() => 0);
  const visit = (at: number, order: number, taken: number, frequencyHz: number): void => {
    if (at === frequenciesHz.length) {
      if (order > 0 && frequencyHz >= band.lowHz && frequencyHz <= band.highHz)
        found.push({ multipliers: [...multipliers], order, frequencyHz, offsetHz: frequencyHz - middleHz });
      return;
    }
    const most = taken < MOST_TRANSMITTERS_IN_A_MIX ? highestOrder - order : 0;
    for (let times = -most; times <= most; times++) {
      multipliers[at] = times;
      visit(at + 1, order + Math.abs(times), taken + (times === 0 ? 0 : 1), frequencyHz + times * frequenciesHz[at]);
    }
    multipliers[at] = 0;
  };
  visit(0, 0, 0, 0);
  return found.sort((a, b) => a.order - b.order || Math.abs(a.offsetHz) - Math.abs(b.offsetHz));
}
