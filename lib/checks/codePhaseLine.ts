import { CA_CHIP_RATE_HZ, CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { circularDifference } from "./circularDifference";
import type { Finding, NumberLine } from "./markNumber";
import { parseCodePhase } from "./parseCodePhase";

/** How a code phase at the first sample is read, compared and explained. */
export const codePhaseLine = (
  computedChips: number,
  toleranceChips: number,
  rateHz: number,
): Pick<
  NumberLine,
  "computed" | "unit" | "decimals" | "tolerance" | "read" | "impossible" | "difference" | "explain"
> => ({
  computed: computedChips,
  unit: "chip",
  decimals: 2,
  tolerance: toleranceChips,
  read: parseCodePhase,
  impossible: (value) => outOfCode(value, computedChips, rateHz),
  difference: (value, computed) => circularDifference(value, computed, CA_LENGTH_CHIPS),
  explain: (value) => mirrored(value, computedChips, toleranceChips) ?? samplesForChips(value, computedChips, rateHz),
});

/** Half a chip beyond either end is still taken round; more is no phase of this code. */
function outOfCode(value: number, computedChips: number, rateHz: number): Finding | null {
  if (value >= -0.5 && value <= CA_LENGTH_CHIPS + 0.5) return null;
  return (
    samplesForChips(value, computedChips, rateHz) ?? {
      errorClass: null,
      reason: "A code is 1\u2009023 chips long, so code phase runs from 0 to 1\u2009023 chip.",
    }
  );
}

function mirrored(value: number, computedChips: number, toleranceChips: number): Finding | null {
  const off = Math.abs(circularDifference(value, CA_LENGTH_CHIPS - computedChips, CA_LENGTH_CHIPS));
  if (!(off <= toleranceChips)) return null;
  return {
    errorClass: "mirrored delay (1 023 - x)",
    reason: "This is 1\u2009023 chip minus the code phase: it is the delay of the replica.",
  };
}

function samplesForChips(value: number, computedChips: number, rateHz: number): Finding | null {
  const samplesPerChip = rateHz / CA_CHIP_RATE_HZ;
  if (!(Math.abs(value - computedChips * samplesPerChip) <= samplesPerChip)) return null;
  return {
    errorClass: "samples for chips",
    reason: `Samples were counted, not chips. There are ${samplesPerChip} samples to a chip.`,
  };
}
