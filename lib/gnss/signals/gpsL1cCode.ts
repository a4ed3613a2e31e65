import { L1_HZ } from "../constants";
import type { Levels } from "../shiftRegister";
import { weilSequence } from "../weilCode";

const LEGENDRE_LENGTH = 10_223; // IS-GPS-800, 3.2.2.1
const INSERTED = [0, 1, 1, 0, 1, 0, 0]; // same section

/** What the two components of L1C have in common. */
export const gpsL1c = {
  carrierHz: L1_HZ,
  chipRateHz: 1.023e6,
  lengthChips: LEGENDRE_LENGTH + INSERTED.length,
  source: "IS-GPS-800, 3.2.2.1, Table 3.2-2",
} as const;

/**
 * A Weil sequence of 10,223 chips with seven chips put in.
 * @param row Weil index, and the place (from 1) which the first chip put in takes
 */
export function gpsL1cCode([weilIndex, insertion]: readonly [number, number]): Levels {
  const weil = weilSequence(LEGENDRE_LENGTH, weilIndex);
  const levels = new Uint8Array(gpsL1c.lengthChips);
  levels.set(weil.subarray(0, insertion - 1));
  levels.set(INSERTED, insertion - 1);
  levels.set(weil.subarray(insertion - 1), insertion - 1 + INSERTED.length);
  return levels;
}
