import type { Random } from "@/lib/numeric/random";
import type { ParameterSpec } from "./kind";

export type CaptureRate = "2.046" | "4.092" | "either";

const RATES_HZ = { "2.046": 2_046_000, "4.092": 4_092_000 } as const;

export const rateParameter = (byDefault: CaptureRate): ParameterSpec => ({
  name: "rate",
  label: "Sample rate of the capture",
  help: "In million complex samples a second; either draws one of the two.",
  input: "choice",
  choices: [
    { value: "2.046", label: "2.046 MHz" },
    { value: "4.092", label: "4.092 MHz" },
    { value: "either", label: "Either" },
  ],
  default: byDefault,
});

/** Draws once whatever the parameter says, so that fixing the rate moves nothing else of a case. */
export function drawRateHz(rate: CaptureRate, random: Random): number {
  const drawn = random.pick(["2.046", "4.092"] as const);
  return RATES_HZ[rate === "either" ? drawn : rate];
}
