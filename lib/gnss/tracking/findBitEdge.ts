/** Place of the data bits among the code periods. */
export type BitEdge = {
  /** Code period, counted from the first one, at which a bit begins; 0 to one less than the bit's length. */
  edge: number;
  /** Energy inside the bits for this place over that for the second best, less 1; the surer the larger. */
  margin: number;
};

const FEWEST_BITS = 5;
const LEAST_MARGIN = 0.02;

/**
 * Bit synchronisation: for each place that the bits can have, the powers of the sums over whole bits are added; the
 * right place keeps signs together. Maximum likelihood for unknown bits; Kokkonen & Pietila, "A new bit synchronization
 * method for a GPS receiver" (2002; from memory).
 * @param prompts complex sums of code periods, real and imaginary parts alternating, the phase nearly steady over a bit
 * @param periodsPerBit 20 for GPS L1 C/A
 * @returns null with fewer than five bits, or when two places do nearly alike: no bit has changed, or noise rules
 */
export function findBitEdge(prompts: ArrayLike<number>, periodsPerBit: number): BitEdge | null {
  const periods = prompts.length / 2;
  const bits = Math.floor(periods / periodsPerBit) - 1;
  if (bits < FEWEST_BITS) return null;
  const energies = Array.from({ length: periodsPerBit }, (_, edge) => energyAt(prompts, periodsPerBit, edge, bits));
  const best = energies.reduce((found, energy, edge) => (energy > energies[found] ? edge : found), 0);
  const second = energies.reduce((found, energy, edge) => (edge !== best && energy > found ? energy : found), 0);
  const margin = energies[best] / second - 1;
  return margin >= LEAST_MARGIN ? { edge: best, margin } : null;
}

function energyAt(prompts: ArrayLike<number>, periodsPerBit: number, edge: number, bits: number): number {
  let energy = 0;
  for (let bit = 0; bit < bits; bit++) {
    let [re, im] = [0, 0];
    for (let n = 0; n < periodsPerBit; n++) {
      const at = 2 * (edge + bit * periodsPerBit + n);
      re += prompts[at];
      im += prompts[at + 1];
    }
    energy += re * re + im * im;
  }
  return energy;
}
