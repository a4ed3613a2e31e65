import { cosTurns, PI, sinTurns } from "@/lib/numeric/elementary";

const STEPS = 200; // midpoint rule over the band; error below 1e-5

/**
 * Correlation of a chip code with a copy of it, both kept to the band of one chip rate either side of the carrier as a search
 * keeps them: the mean of cos(2 pi f tau) weighted by the spectrum (sin(pi f)/(pi f))^2 of random chips. Textbook.
 * @param offsetChips tau, any
 * @returns 1 at no offset
 */
export function peakShape(offsetChips: number): number {
  let sum = 0;
  SPECTRUM.forEach((weight, n) => (sum += weight * cosTurns(((n + 0.5) / STEPS) * offsetChips)));
  return sum / POWER;
}

const SPECTRUM = Float64Array.from({ length: STEPS }, (_, n) => {
  const f = (n + 0.5) / STEPS;
  const root = sinTurns(f / 2) / (PI * f);
  return root * root;
});
const POWER = SPECTRUM.reduce((sum, weight) => sum + weight, 0);
