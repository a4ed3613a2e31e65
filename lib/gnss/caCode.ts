import { CA_G2_DELAYS } from "./caDelays";
import { chipsOf, registerOutput, registerSequence, type Chips, type Levels } from "./shiftRegister";

const G1 = 0o2011; // 1 + x^3 + x^10, IS-GPS-200, 3.3.2.3
const G2 = 0o3515; // 1 + x^2 + x^3 + x^6 + x^8 + x^9 + x^10, same section

/** G2 phase-selector stages by PRN, counted from 1. IS-GPS-200, Table 3-Ia; PRN 33 to 37 are reserved for other uses. */
// prettier-ignore
export const CA_G2_STAGES: ReadonlyMap<number, readonly [number, number]> = new Map([
  [1, [2, 6]], [2, [3, 7]], [3, [4, 8]], [4, [5, 9]], [5, [1, 9]], [6, [2, 10]], [7, [1, 8]], [8, [2, 9]],
  [9, [3, 10]], [10, [2, 3]], [11, [3, 4]], [12, [5, 6]], [13, [6, 7]], [14, [7, 8]], [15, [8, 9]], [16, [9, 10]],
  [17, [1, 4]], [18, [2, 5]], [19, [3, 6]], [20, [4, 7]], [21, [5, 8]], [22, [6, 9]], [23, [1, 3]], [24, [4, 6]],
  [25, [5, 7]], [26, [6, 8]], [27, [7, 9]], [28, [8, 10]], [29, [1, 6]], [30, [2, 7]], [31, [3, 8]], [32, [4, 9]],
  [33, [5, 10]], [34, [4, 10]], [35, [1, 7]], [36, [2, 8]], [37, [4, 10]],
]);

const made = new Map<number, Chips>();

/**
 * C/A code of one satellite, one period of 1023 chips of +1 (logic 0) or -1 (logic 1), first chip first. The array is
 * shared between callers: do not write into it.
 * @param prn 1 to 63, 120 to 158 or 183 to 206; 34 and 37 are the same code
 * @throws RangeError when no code is published for it
 */
export function caCode(prn: number): Chips {
  const known = made.get(prn);
  if (known) return known;
  const g1 = registerSequence(G1);
  const g2 = g2Of(prn);
  const code = chipsOf(g1.map((level, n) => level ^ g2[n]));
  made.set(prn, code);
  return code;
}

/** The satellite's own G2 sequence: the sum of two stages, or the last stage some chips late. */
function g2Of(prn: number): Levels {
  const stages = CA_G2_STAGES.get(prn);
  if (stages) return registerOutput(G2, (1 << (stages[0] - 1)) | (1 << (stages[1] - 1)));
  const delay = CA_G2_DELAYS.get(prn);
  if (delay === undefined) throw new RangeError(`caCode: prn has no published stages or delay, got ${prn}`);
  const plain = registerSequence(G2);
  return plain.map((_, n) => plain[(n + plain.length - delay) % plain.length]);
}
