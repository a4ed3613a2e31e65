import { createFft } from "@/lib/numeric/fft";
import { signalLines } from "../signalLines";
import type { SearchSignal } from "./searchSignal";

/** One period of a signal as values at equal steps of code phase; index n stands for the step from n to n + 1. */
export type SignalWaveform = { values: Float64Array; pointsPerChip: number };

/** Hard chips with their subcarrier, as a front end of infinite bandwidth has them. */
export function hardWaveform(signal: SearchSignal, prn: number): SignalWaveform {
  const chips = signal.chips(prn);
  const pointsPerChip = signal.halvesPerChip;
  const values = Float64Array.from({ length: chips.length * pointsPerChip }, (_, n) => {
    const half = n % pointsPerChip;
    return (half % 2 ? -1 : 1) * chips[(n - half) / pointsPerChip];
  });
  return { values, pointsPerChip };
}

const POINTS_PER_CHIP = 32; // about; the table's length is a power of two

/** The same behind an ideal low-pass filter that keeps the lines up to `highest`. */
export function filteredWaveform(signal: SearchSignal, prn: number, highest: number): SignalWaveform {
  let size = 64;
  while (size < POINTS_PER_CHIP * signal.lengthChips * 0.99) size *= 2;
  const lines = signalLines(signal.chips(prn), signal.halvesPerChip, Math.min(highest, size / 2 - 1));
  const spectrum = new Float64Array(2 * size);
  for (let k = 0; 2 * k < lines.length; k++) {
    // The wave is real: the conjugates of twice the positive lines, transformed forwards, have it as their real part.
    spectrum[2 * k] = (k > 0 ? 2 : 1) * lines[2 * k];
    spectrum[2 * k + 1] = -(k > 0 ? 2 : 1) * lines[2 * k + 1];
  }
  const wave = new Float64Array(2 * size);
  createFft(size).transform(wave, spectrum);
  // Index n stands for its step's middle, as with hard chips: half a step's shift is far below what matters here.
  return {
    values: Float64Array.from({ length: size }, (_, n) => wave[2 * n]),
    pointsPerChip: size / signal.lengthChips,
  };
}
