import { registerRun, type Levels } from "../shiftRegister";

const LENGTH_CHIPS = 10_230; // Galileo OS SIS ICD, issue 2, 3.4.1
const ALL_ONES = 0o37777;

/** What the four components of E5 have in common; each side band is received by itself as BPSK-R(10). */
export const galileoE5 = {
  chipRateHz: 10.23e6,
  lengthChips: LENGTH_CHIPS,
  modulation: { kind: "BPSK-R", n: 10 },
} as const;

export const E5A_HZ = 1176.45e6; // Galileo OS SIS ICD, issue 2
export const E5B_HZ = 1207.14e6; // same document

/**
 * The sum of two registers of 14 stages, both started afresh after 10,230 chips: the first from all ones, the second from
 * the satellite's own content.
 */
export function galileoE5Code([first, second]: readonly [number, number], start: number): Levels {
  const base = registerRun(first, ALL_ONES, LENGTH_CHIPS);
  const own = registerRun(second, start, LENGTH_CHIPS);
  return base.map((level, n) => level ^ own[n]);
}
