import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";

const POLES = 12;
const SETTLED = 1e-12; // of the filter's energy

/** Second-order section of a digital filter, direct form: y = b0 (x + 2 x1 + x2) - a1 y1 - a2 y2. */
type Section = { b0: number; a1: number; a2: number };

/**
 * Complex Gaussian noise of mean |x|^2 = 1 whose spectrum is even over a width about 0 Hz: white draws through a
 * Butterworth low-pass filter of twelve poles by the bilinear transform, 3 dB down at half of the width. Oppenheim &
 * Schafer, "Discrete-Time Signal Processing", chapter on filter design. A width of the whole rate is white.
 * @param random drawn twice per sample, I then Q
 */
export function createBandNoise(widthHz: number, rateHz: number, random: Random): () => { i: number; q: number } {
  if (widthHz >= rateHz) return () => ({ i: Math.SQRT1_2 * random.gaussian(), q: Math.SQRT1_2 * random.gaussian() });
  const sections = lowPass(widthHz / 2 / rateHz);
  const scale = 1 / Math.sqrt(2 * impulseEnergy(sections));
  const [alongI, alongQ] = [createFilter(sections), createFilter(sections)];
  return () => ({ i: alongI(scale * random.gaussian()), q: alongQ(scale * random.gaussian()) });
}

/** @param edge as a share of the sampling rate, below 1/2 */
function lowPass(edge: number): Section[] {
  const w = sinTurns(edge / 2) / cosTurns(edge / 2); // tan(pi edge), the bilinear transform's own frequency
  return Array.from({ length: POLES / 2 }, (_, n) => {
    const damping = 2 * sinTurns((2 * n + 1) / (4 * POLES));
    const norm = 1 / (1 + damping * w + w * w);
    return { b0: w * w * norm, a1: 2 * (w * w - 1) * norm, a2: (1 - damping * w + w * w) * norm };
  });
}

function createFilter(sections: readonly Section[]): (x: number) => number {
  const memory = sections.map(() => ({ x1: 0, x2: 0, y1: 0, y2: 0 }));
  return (input) => {
    let value = input;
    for (let n = 0; n < sections.length; n++) {
      const { b0, a1, a2 } = sections[n];
      const past = memory[n];
      const y = b0 * (value + 2 * past.x1 + past.x2) - a1 * past.y1 - a2 * past.y2;
      past.x2 = past.x1;
      past.x1 = value;
      past.y2 = past.y1;
      past.y1 = y;
      value = y;
    }
    return value;
  };
}

/** Sum of the squares of the filter's answer to a single 1. */
function impulseEnergy(sections: readonly Section[]): number {
  const filter = createFilter(sections);
  const slowest = Math.max(...sections.map(({ a2 }) => a2)); // square of the largest pole's radius
  let energy = 0;
  let left = 1;
  for (let n = 0; left > SETTLED; n++) {
    const value = filter(n === 0 ? 1 : 0);
    energy += value * value;
    left *= slowest;
  }
  return energy;
}
