import type { Levels } from "../shiftRegister";

const FEEDBACK = 0o1112225171 >> 1; // IS-GPS-200, 3.3.2.4: 27 stages, the shortened octal form of the polynomial
const CHIP_RATE_HZ = 511.5e3; // IS-GPS-200, 3.3.2.4
export const L2_HZ = 1227.6e6; // IS-GPS-200, 3.3.1.1

/** What the two codes of L2C have in common: they take turns, chip by chip, the moderate one first. */
export const gpsL2c = { carrierHz: L2_HZ, chipRateHz: CHIP_RATE_HZ, secondary: null } as const;

/**
 * L2C code: a modular register of 27 stages, started from the satellite's own content and started afresh after `length`
 * chips. The lowest stage comes out; everything moves down, and an output of 1 turns the tapped stages.
 * @param start initial content as printed
 */
export function gpsL2cCode(start: number, length: number): Levels {
  const levels = new Uint8Array(length);
  let state = start;
  for (let n = 0; n < length; n++) {
    const level = state & 1;
    levels[n] = level;
    state = (state >> 1) ^ (FEEDBACK & -level);
  }
  return levels;
}
