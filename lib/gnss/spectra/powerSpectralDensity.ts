import { cosTurns, PI, sinTurns } from "@/lib/numeric/elementary";
import type { Modulation } from "./modulation";

const NEAR_ZERO = 1e-7; // of a turn: there the quotient of two small numbers is replaced by its limit

/**
 * Power spectral density of a signal of power 1 over all frequencies, in 1/Hz.
 * Betz, "Binary Offset Carrier Modulations for Radionavigation", Navigation 48(4), 2001.
 * - BPSK-R: sin^2(pi f/fc) / (fc (pi f/fc)^2)
 * - BOC, sine: fc [sin(pi f/fc) tan(pi f/2fs) / (pi f)]^2, cos(pi f/fc) when 2 fs/fc is odd
 * - BOC, cosine: the tangent becomes (1 - cos x)/cos x with x = pi f/2fs
 * @param offsetHz from the carrier, either side
 */
export function powerSpectralDensity(modulation: Modulation, offsetHz: number): number {
  if (modulation.kind === "sum")
    return modulation.parts.reduce(
      (sum, { share, modulation: part }) => sum + share * powerSpectralDensity(part, offsetHz),
      0,
    );
  const { chipRateHz } = modulation;
  const awayHz = Math.abs(offsetHz);
  if (modulation.kind === "bpsk") {
    const sinc = sincTurns(awayHz / (2 * chipRateHz));
    return (sinc * sinc) / chipRateHz;
  }
  const root = bocAmplitude(awayHz, chipRateHz, modulation.subcarrierHz, modulation.phase === "sine");
  return chipRateHz * root * root;
}

/** sin(x)/x with x = 2 pi turns. */
function sincTurns(turns: number): number {
  return Math.abs(turns) < NEAR_ZERO ? 1 : sinTurns(turns) / (2 * PI * turns);
}

/**
 * sin(pi f/fc) tan(pi f/2fs)/(pi f) and its kin, but for the sign. With x = pi f/2fs, y = x - pi/2 and k = 2 fs/fc half
 * periods of the subcarrier in a chip, both sin(k x)/cos x (even k) and cos(k x)/cos x (odd k) are sin(k y)/sin y.
 */
function bocAmplitude(offsetHz: number, chipRateHz: number, subcarrierHz: number, sine: boolean): number {
  const turns = offsetHz / (4 * subcarrierHz); // x
  if (Math.abs(turns) < NEAR_ZERO) return 0;
  const halves = Math.round((2 * subcarrierHz) / chipRateHz);
  const below = sinTurns(turns - 0.25);
  const chip = Math.abs(below) < NEAR_ZERO ? halves : sinTurns(halves * (turns - 0.25)) / below;
  return (chip * (sine ? sinTurns(turns) : 1 - cosTurns(turns))) / (PI * offsetHz);
}
