import { cosTurns } from "@/lib/numeric/elementary";
import { quadraturePoints } from "@/lib/numeric/quadrature";
import type { Modulation } from "../spectra/modulation";
import { powerSpectralDensity } from "../spectra/powerSpectralDensity";

/** Correlation of a signal with its replica against the delay between them in chips; 1 at 0 without a filter. */
export type CorrelationShape = (delayChips: number) => number;

const POINTS_PER_CHIP = 64; // of the table behind a filter
const REACH_CHIPS = 4; // beyond it the shape is taken as 0, though a filter rings on below 1e-3

/**
 * Autocorrelation of a modulation: without a filter exactly, as straight lines between the half periods of its
 * subcarrier; behind an ideal low-pass filter of two-sided bandwidth B as the integral of G(f) cos(2 pi f tau) over
 * +-B/2, from a table with cubic interpolation (error below 1e-4 up to 16 chip rates of bandwidth). A random code is
 * taken, so it is 0 beyond one chip.
 */
export function correlationShape(modulation: Modulation, bandwidthHz: number | null): CorrelationShape {
  if (bandwidthHz === null) return plainShape(modulation);
  if (!(bandwidthHz > 0)) throw new RangeError(`correlationShape: bandwidth above 0 Hz, got ${bandwidthHz}`);
  const { chipRateHz } = modulation;
  const density = Math.max(POINTS_PER_CHIP, Math.ceil((8 * bandwidthHz) / chipRateHz)); // 16 points per fastest wave
  const table = filteredTable(modulation, bandwidthHz, density);
  return (delayChips) => {
    const place = Math.abs(delayChips) * density;
    return place >= REACH_CHIPS * density ? 0 : cubic(table, place);
  };
}

/** Integral for delays of n/density chips, n from 0 to beyond the reach. */
function filteredTable(modulation: Modulation, bandwidthHz: number, density: number): Float64Array {
  const table = new Float64Array(REACH_CHIPS * density + 3);
  const chipsPerHz = 1 / modulation.chipRateHz;
  const panels = Math.ceil((0.5 + REACH_CHIPS / 2) * bandwidthHz * chipsPerHz); // one wave each at the farthest delay
  const { places, weights } = quadraturePoints(0, bandwidthHz / 2, panels);
  for (let k = 0; k < places.length; k++) {
    const share = 2 * weights[k] * powerSpectralDensity(modulation, places[k]);
    const twice = 2 * cosTurns((places[k] * chipsPerHz) / density);
    let [before, value] = [twice / 2, 1]; // cos((n + 1) x) = 2 cos x cos(n x) - cos((n - 1) x)
    for (let n = 0; n < table.length; n++) {
      table[n] += share * value;
      [before, value] = [value, twice * value - before];
    }
  }
  return table;
}

/** Through the four points around: Lagrange. The shape is even, so the point left of 0 is the one right of it. */
function cubic(table: Float64Array, place: number): number {
  const n = Math.floor(place);
  const t = place - n;
  const [a, b, c, d] = [table[n === 0 ? 1 : n - 1], table[n], table[n + 1], table[n + 2]];
  const second = a - 2 * b + c;
  const third = d - 3 * c + 3 * b - a;
  return b + t * (c - b) + (t * (t - 1) * second) / 2 + (((t + 1) * t * (t - 1)) / 6) * third;
}

function plainShape(modulation: Modulation): CorrelationShape {
  if (modulation.kind === "sum") {
    const parts = modulation.parts.map(({ share, modulation: part }) => ({ share, shape: plainShape(part) }));
    return (delayChips) => parts.reduce((sum, { share, shape }) => sum + share * shape(delayChips), 0);
  }
  const wave = chipWave(modulation);
  const pieces = wave.length;
  const corners = Float64Array.from({ length: pieces + 1 }, (_, lag) => {
    let sum = 0;
    for (let n = 0; n + lag < pieces; n++) sum += wave[n] * wave[n + lag];
    return sum / pieces;
  });
  return (delayChips) => {
    const place = Math.abs(delayChips) * pieces;
    if (place >= pieces) return 0;
    const n = Math.floor(place);
    return corners[n] + (place - n) * (corners[n + 1] - corners[n]);
  };
}

/** Signs of a chip's wave in pieces of equal length: half periods of a sine subcarrier, quarters of a cosine one. */
function chipWave(modulation: Exclude<Modulation, { kind: "sum" }>): number[] {
  if (modulation.kind === "bpsk") return [1];
  const halves = Math.round((2 * modulation.subcarrierHz) / modulation.chipRateHz);
  if (modulation.phase === "sine") return Array.from({ length: halves }, (_, n) => (n % 2 === 0 ? 1 : -1));
  return Array.from({ length: 2 * halves }, (_, n) => (((n + 1) >> 1) % 2 === 0 ? 1 : -1));
}
