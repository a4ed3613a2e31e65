import type { ValuesOf } from "@/lib/calculators/calculator";
import type { LOOP_JITTER } from "@/lib/calculators/loopJitter";
import { CA_CHIP_RATE_HZ, L1_HZ } from "@/lib/gnss/constants";
import { pllJitterDeg } from "@/lib/gnss/tracking/carrierJitter";
import { dllJitterChips } from "@/lib/gnss/tracking/dllJitter";
import { PHASE_LIMIT_DEG, dynamicStressDeg, phaseMarginDeg } from "@/lib/gnss/tracking/loopStress";
import { codeMarginChips } from "@/lib/gnss/tracking/loopThresholds";
import { findRoot } from "@/lib/numeric/findRoot";

export type LoopValues = ValuesOf<typeof LOOP_JITTER>;

export const STANDARD_GRAVITY_M_S2 = 9.80665; // exact, General Conference on Weights and Measures 1901
const LOWEST_DB_HZ = 0;
const HIGHEST_DB_HZ = 80;

export type Loops = {
  thermalDeg: number;
  stressDeg: number;
  /** Below 0 the carrier loop is expected to lose lock. */
  phaseMarginDeg: number;
  /** Where that margin is 0; null when the other shares alone use it up. */
  phaseThresholdDbHz: number | null;
  codeChips: number;
  codeMarginChips: number;
  /** Three sigma and the stress, and the code's jitter in chips, at any C/N0. */
  phaseAt: (cn0DbHz: number) => number;
  codeAt: (cn0DbHz: number) => number;
};

/** Errors and margins of a third-order carrier loop and of the code loop that it aids, GPS L1 C/A. */
export function loopsOf(values: LoopValues): Loops {
  const { cn0DbHz, carrierLoopHz, codeLoopHz, spacingChips, frontEndMHz, vibrationDeg, oscillatorDeg } = values;
  const coherentS = values.coherentMs / 1000;
  const stressDeg = dynamicStressDeg(3, values.jerkGPerS * STANDARD_GRAVITY_M_S2, carrierLoopHz, L1_HZ);
  const marginAt = (cn0: number) =>
    phaseMarginDeg({ thermalDeg: pllJitterDeg(carrierLoopHz, cn0, coherentS), vibrationDeg, oscillatorDeg, stressDeg });
  const frontEndHz = frontEndMHz === null ? null : frontEndMHz * 1e6;
  const codeAt = (cn0: number) =>
    dllJitterChips({ loopHz: codeLoopHz, spacingChips, cn0DbHz: cn0, coherentS }, CA_CHIP_RATE_HZ, frontEndHz);
  const codeChips = codeAt(cn0DbHz);
  return {
    thermalDeg: pllJitterDeg(carrierLoopHz, cn0DbHz, coherentS),
    stressDeg,
    phaseMarginDeg: marginAt(cn0DbHz),
    phaseThresholdDbHz: marginAt(HIGHEST_DB_HZ) > 0 ? findRoot(marginAt, LOWEST_DB_HZ, HIGHEST_DB_HZ, 1e-6) : null,
    codeChips,
    codeMarginChips: codeMarginChips(codeChips, 0, spacingChips),
    phaseAt: (cn0) => PHASE_LIMIT_DEG - marginAt(cn0),
    codeAt,
  };
}
