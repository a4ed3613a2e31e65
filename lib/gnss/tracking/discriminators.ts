import { atan2, PI } from "@/lib/numeric/elementary";

/** Complex sums of one correlation: early, prompt and late replica. */
export type Correlation = {
  earlyI: number;
  earlyQ: number;
  promptI: number;
  promptQ: number;
  lateI: number;
  lateQ: number;
};

/*
 * Discriminators of Kaplan & Hegarty, "Understanding GPS", 2nd edition, Tables 5.2 to 5.5. Those of the code are above
 * 0 when the replica is late, and a small error comes out in chips with the scale R/|R'| of the correlation R at half
 * of the spacing D: 1 - D/2 for rectangular chips without a filter, `discriminatorScaleChips` for all others.
 */

/** Early minus late envelope over their sum, scale (E - L)/(E + L). Needs no phase lock. */
export function envelopeDiscriminator(sums: Correlation, scaleChips: number): number {
  const early = Math.sqrt(sums.earlyI * sums.earlyI + sums.earlyQ * sums.earlyQ);
  const late = Math.sqrt(sums.lateI * sums.lateI + sums.lateQ * sums.lateQ);
  return early + late > 0 ? (scaleChips * (early - late)) / (early + late) : 0;
}

/** Early minus late power over their sum, scale/2 (E^2 - L^2)/(E^2 + L^2). Needs no phase lock. */
export function powerDiscriminator(sums: Correlation, scaleChips: number): number {
  const early = sums.earlyI * sums.earlyI + sums.earlyQ * sums.earlyQ;
  const late = sums.lateI * sums.lateI + sums.lateQ * sums.lateQ;
  return early + late > 0 ? (scaleChips * (early - late)) / (2 * (early + late)) : 0;
}

/**
 * Quasi-coherent dot product over the prompt's power, ((I_E - I_L) I_P + (Q_E - Q_L) Q_P)/(2 (I_P^2 + Q_P^2)): in chips
 * for plain chips.
 */
export function dotProductDiscriminator(sums: Correlation): number {
  const { promptI, promptQ } = sums;
  const power = promptI * promptI + promptQ * promptQ;
  const dot = (sums.earlyI - sums.lateI) * promptI + (sums.earlyQ - sums.lateQ) * promptQ;
  return power > 0 ? dot / (2 * power) : 0;
}

/**
 * Coherent (I_E - I_L)/(2 |I_P|), for a loop in phase lock: in chips for plain chips; the data bit's sign falls out.
 */
export const coherentDiscriminator = ({ earlyI, lateI, promptI }: Correlation): number =>
  promptI === 0 ? 0 : (earlyI - lateI) / (2 * promptI);

/** Phase of the prompt sum in cycles, -1/4 to 1/4, whatever the data bit: Costas loop, two-quadrant arctangent. */
export function costasPhaseCycles({ promptI, promptQ }: Correlation): number {
  const flipped = promptI < 0 ? -1 : 1;
  return atan2(flipped * promptQ, flipped * promptI) / (2 * PI);
}

/** Phase of the prompt sum in cycles, -1/2 to 1/2: for a pilot without data, four-quadrant arctangent. */
export const pilotPhaseCycles = ({ promptI, promptQ }: Correlation): number => atan2(promptQ, promptI) / (2 * PI);

/**
 * Frequency in Hz by which the signal lies above the replica, from two prompt sums: the turn from the first to the
 * second over the time between. With `flips` a sign change between the two is taken for a data bit, and the range is
 * halved to -1/(4T) to 1/(4T).
 */
export function frequencyDiscriminatorHz(
  first: { promptI: number; promptQ: number },
  second: { promptI: number; promptQ: number },
  timeS: number,
  flips: boolean,
): number {
  const dot = first.promptI * second.promptI + first.promptQ * second.promptQ;
  const cross = first.promptI * second.promptQ - first.promptQ * second.promptI;
  const sign = flips && dot < 0 ? -1 : 1;
  return atan2(sign * cross, sign * dot) / (2 * PI * timeS);
}
