"use client";
import type { PULSE_ERROR } from "@/lib/calculators/pulseError";
import type { CalculatorProps } from "./calculatorProps";
import { PulseHoldover } from "./PulseHoldover";
import { PulseLog } from "./PulseLog";

/** Time error of a pulse output: from a log against the limits of its class, or computed for the time without reference. */
export function PulseError(props: CalculatorProps<typeof PULSE_ERROR>) {
  return props.values.source === "log" ? <PulseLog {...props} /> : <PulseHoldover {...props} />;
}
