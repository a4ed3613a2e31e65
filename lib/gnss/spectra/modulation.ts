import { CA_CHIP_RATE_HZ } from "../constants";

/**
 * How the chips of a code shape its spectrum. Rectangular chips; the code is taken as random, so its lines are left
 * out.
 * - bpsk: plain chips
 * - boc: chips times a square subcarrier that starts at 0 (sine) or a quarter period on (cosine)
 * - sum: parts of the power, each with a modulation of its own; the shares add up to 1
 */
export type Modulation =
  | { kind: "bpsk"; chipRateHz: number }
  | { kind: "boc"; chipRateHz: number; subcarrierHz: number; phase: "sine" | "cosine" }
  | { kind: "sum"; chipRateHz: number; parts: readonly { share: number; modulation: Modulation }[] };

/**
 * BPSK-R(n): rectangular chips at n * 1.023 MHz. Betz, "Binary Offset Carrier Modulations for Radionavigation" (2001).
 */
export const bpsk = (n: number): Modulation => ({ kind: "bpsk", chipRateHz: n * CA_CHIP_RATE_HZ });

/** BOC(m, n): subcarrier m * 1.023 MHz, chips n * 1.023 MHz; 2m/n is a whole number. Betz (2001). */
export function boc(m: number, n: number, phase: "sine" | "cosine" = "sine"): Modulation {
  if (!(m > 0 && n > 0 && Number.isInteger((2 * m) / n)))
    throw new RangeError(`boc: 2m/n a whole number from 1, got BOC(${m},${n})`);
  return { kind: "boc", chipRateHz: n * CA_CHIP_RATE_HZ, subcarrierHz: m * CA_CHIP_RATE_HZ, phase };
}

/** MBOC(6,1,1/11): 10/11 BOC(1,1) and 1/11 BOC(6,1); Galileo OS SIS ICD, E1, and IS-GPS-800, L1C. */
export const MBOC: Modulation = {
  kind: "sum",
  chipRateHz: CA_CHIP_RATE_HZ,
  parts: [
    { share: 10 / 11, modulation: boc(1, 1) },
    { share: 1 / 11, modulation: boc(6, 1) },
  ],
};
