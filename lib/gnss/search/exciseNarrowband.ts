import { decibels, sinTurns } from "@/lib/numeric/elementary";
import { createFft } from "@/lib/numeric/fft";
import type { MutableCapture } from "./blankPulses";

/** What narrow-band interference was taken out. */
export type Excision = {
  /** Share of the time-frequency plane set to zero; 0 when there was nothing. */
  share: number;
  /** Stretches of the spectrum that were hit in at least a tenth of the time, strongest first. */
  bands: { fromHz: number; toHz: number; overNoiseDb: number }[];
};

const CELL_HZ = 1000;
const SEED = 16; // 12 dB: noise alone reaches it once in nine million cells, the lines of a code at 58 dB-Hz do not
const SKIRT = 3; // around a seed, as far down as this
const LEAST_SHARE = 2e-4; // one spectral line of a tone is more than this
const FLOOR_SHARE = 0.25; // of the band, around a cell: interference up to half as wide does not raise the floor
const LN_2 = 0.6931471805599453;

/**
 * Takes narrow-band interference out of samples, in place: spectra of about a millisecond, overlapping by half under a sine
 * window on either side of the transform; cells that stand out of the noise floor are set to zero. The floor of a cell is
 * the median over the time, smoothed by a median over the frequency, so that neither a steady tone nor a slow sweep raises
 * it. Frequencies are those of the samples.
 */
export function exciseNarrowband(capture: MutableCapture): Excision {
  const { samples, complex, rateHz } = capture;
  const count = complex ? samples.length / 2 : samples.length;
  let size = 64;
  while (size < rateHz / CELL_HZ) size *= 2;
  while (size > 64 && size > count / 4) size /= 2;
  const half = size / 2;
  const blocks = Math.ceil(count / half) + 1; // the first begins half a block early
  if (count < 4 * size) return { share: 0, bands: [] };
  const spectra = createBlockSpectra(capture, size);
  const powers = new Float32Array(blocks * size);
  for (let block = 0; block < blocks; block++) powersOf(powers.subarray(block * size), spectra.analyse(block));
  const floor = noiseFloor(powers, size, blocks);
  const hit = markCells(powers, floor, size, blocks);
  const hits = hit.reduce((sum, one) => sum + one, 0);
  if (hits < LEAST_SHARE * hit.length) return { share: 0, bands: [] };
  const cleaned = new Float32Array(samples.length);
  for (let block = 0; block < blocks; block++) {
    const spectrum = spectra.analyse(block);
    for (let k = 0; k < size; k++) if (hit[block * size + k]) spectrum.fill(0, 2 * k, 2 * k + 2);
    spectra.addBack(cleaned, block, spectrum);
  }
  samples.set(cleaned);
  return { share: hits / hit.length, bands: bandsOf(hit, powers, floor, size, blocks, capture) };
}

function createBlockSpectra({ samples, complex }: MutableCapture, size: number) {
  const fft = createFft(size);
  const window = Float64Array.from({ length: size }, (_, n) => sinTurns((n + 0.5) / (2 * size)));
  const padded = new Float64Array(2 * size);
  const spectrum = new Float64Array(2 * size);
  const step = complex ? 2 : 1;
  const each = (block: number, visit: (n: number, at: number) => void) => {
    const first = (block - 1) * (size / 2);
    const last = Math.min(size, samples.length / step - first);
    for (let n = Math.max(0, -first); n < last; n++) visit(n, step * (first + n));
  };
  const analyse = (block: number): Float64Array => {
    padded.fill(0);
    each(block, (n, at) => {
      padded[2 * n] = window[n] * samples[at];
      if (complex) padded[2 * n + 1] = window[n] * samples[at + 1];
    });
    fft.transform(spectrum, padded);
    return spectrum;
  };
  const addBack = (out: Float32Array, block: number, from: Float64Array): void => {
    fft.inverseTransform(padded, from);
    each(block, (n, at) => {
      out[at] += window[n] * padded[2 * n];
      if (complex) out[at + 1] += window[n] * padded[2 * n + 1];
    });
  };
  return { analyse, addBack };
}

function powersOf(out: Float32Array, spectrum: Float64Array): void {
  for (let k = 0; k < spectrum.length / 2; k++)
    out[k] = spectrum[2 * k] * spectrum[2 * k] + spectrum[2 * k + 1] * spectrum[2 * k + 1];
}

function noiseFloor(powers: Float32Array, size: number, blocks: number): Float64Array {
  const series = new Float32Array(blocks - 2); // the outermost blocks are half empty
  const overTime = Float64Array.from({ length: size }, (_, k) => {
    for (let block = 1; block < blocks - 1; block++) series[block - 1] = powers[block * size + k];
    return series.sort()[series.length >> 1];
  });
  const step = Math.max(1, size >> 8); // neighbours say nearly the same
  const side = Math.floor((FLOOR_SHARE * size) / 2 / step);
  const around = new Float64Array(2 * side + 1);
  const floor = new Float64Array(size);
  for (let k = 0; k < size; k += step) {
    for (let n = -side; n <= side; n++) around[n + side] = overTime[(k + n * step + size) % size];
    floor.fill(around.sort()[side] / LN_2, k, k + step); // the mean of an exponential law over its median
  }
  return floor;
}

/** 1 for every cell to be emptied: seeds, and what hangs together with them in frequency. */
function markCells(powers: Float32Array, floor: Float64Array, size: number, blocks: number): Uint8Array {
  const hit = new Uint8Array(blocks * size);
  for (let block = 0; block < blocks; block++) {
    const over = (k: number) => powers[block * size + k] / floor[k];
    for (let k = 0; k < size; k++) {
      if (!(over(k) > SEED)) continue;
      for (const step of [1, size - 1]) {
        let at = k;
        for (let n = 0; n < size && (n < 2 || over(at) > SKIRT); n++) {
          hit[block * size + at] = 1;
          at = (at + step) % size;
        }
      }
    }
  }
  return hit;
}

function bandsOf(
  hit: Uint8Array,
  powers: Float32Array,
  floor: Float64Array,
  size: number,
  blocks: number,
  { rateHz, complex }: MutableCapture,
): Excision["bands"] {
  const often = Array.from({ length: size }, (_, k) => {
    let times = 0;
    for (let block = 0; block < blocks; block++) times += hit[block * size + k];
    return times > blocks / 10;
  });
  const bands: Excision["bands"] = [];
  const lowest = complex ? -size / 2 : 0; // a real capture shows everything twice
  let from = lowest;
  for (let k = lowest; k <= size / 2; k++) {
    const inside = k < size / 2 && often[(k + size) % size];
    if (inside) continue;
    if (k > from) {
      let most = 0;
      for (let n = from; n < k; n++) {
        const at = (n + size) % size;
        let sum = 0;
        for (let block = 0; block < blocks; block++) sum += powers[block * size + at];
        most = Math.max(most, sum / blocks / floor[at]);
      }
      bands.push({
        fromHz: ((from - 0.5) * rateHz) / size,
        toHz: ((k - 0.5) * rateHz) / size,
        overNoiseDb: decibels(most),
      });
    }
    from = k + 1;
  }
  return bands.sort((a, b) => b.overNoiseDb - a.overNoiseDb);
}
