/**
 * Something that disturbs a capture. Offsets are from 0 Hz of the complex samples; what lies beyond half of their rate
 * does not pass the front end and is left out.
 * - tone: a single carrier
 * - narrow-fm: a carrier swung sinusoidally by +-deviation
 * - sweep: frequency runs evenly over a width, from below to above, and starts again or runs back
 * - pulse: a carrier that is on for a share of each period
 * - noise: Gaussian, even over a width (twelve-pole edges)
 * - matched-code: another C/A code, or the same, with its own phase and Doppler; no data
 */
export type Interferer = {
  /** Mean |x|^2 while it is on, in squared units of the samples. */
  power: number;
} & (
  | { kind: "tone"; offsetHz: number; phaseCycles: number }
  | { kind: "narrow-fm"; offsetHz: number; deviationHz: number; modulationHz: number }
  | { kind: "sweep"; offsetHz: number; widthHz: number; periodS: number; shape: "saw" | "triangle" }
  | { kind: "pulse"; offsetHz: number; periodS: number; onShare: number }
  | { kind: "noise"; offsetHz: number; widthHz: number }
  | { kind: "matched-code"; prn: number; codePhaseChips: number; dopplerHz: number }
);

/** Refuses what cannot be. @throws RangeError naming the rule and the value */
export function checkInterferer(interferer: Interferer): void {
  const must = (holds: boolean, rule: string, value: number) => {
    if (!holds) throw new RangeError(`interferer: ${rule}, got ${value}`);
  };
  must(interferer.power >= 0 && interferer.power < Infinity, "power from 0", interferer.power);
  if (interferer.kind === "narrow-fm") {
    must(interferer.deviationHz >= 0, "deviation from 0 Hz", interferer.deviationHz);
    must(interferer.modulationHz > 0, "modulation above 0 Hz", interferer.modulationHz);
  }
  if (interferer.kind === "sweep") must(interferer.widthHz > 0, "width above 0 Hz", interferer.widthHz);
  if (interferer.kind === "sweep" || interferer.kind === "pulse")
    must(interferer.periodS > 0, "period above 0 s", interferer.periodS);
  if (interferer.kind === "pulse")
    must(interferer.onShare > 0 && interferer.onShare <= 1, "share above 0 up to 1", interferer.onShare);
  if (interferer.kind === "noise") must(interferer.widthHz > 0, "width above 0 Hz", interferer.widthHz);
}
