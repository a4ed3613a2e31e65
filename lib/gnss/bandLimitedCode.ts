import { codeHarmonics } from "./codeHarmonics";
import { codeWave } from "./codeWave";
import { CA_LENGTH_CHIPS } from "./constants";

/** Points of one code period in the table, 32 per chip. */
export const CODE_TABLE_POINTS = 32_768;
const EDGE_LINES = 12; // kHz left free at the band's edge, so that Doppler moves no line out of it

/** Highest line (kHz) of a code that passes a front end sampled at a rate: all but the outermost 12 kHz. */
export const highestLineInBand = (samplesPerPeriod: number): number => Math.floor(samplesPerPeriod / 2) - EDGE_LINES;

const made = new Map<string, Float64Array>();

/**
 * One period of a C/A code behind an ideal low-pass filter that keeps the lines up to `highestLine` kHz, scaled to power 1.
 * A filtered code changes smoothly with the delay; hard chips sampled twice per chip would not change at all within half a
 * chip, and no method could then read the delay finer.
 * @returns CODE_TABLE_POINTS + 1 values, the last equal to the first, for linear interpolation (error below 1e-3 of the
 *   code's power at 4 MHz bandwidth). Shared: do not write into it
 */
export function bandLimitedCode(prn: number, highestLine: number): Float64Array {
  const key = `${prn}/${highestLine}`;
  const known = made.get(key);
  if (known) return known;
  const table = codeWave(codeHarmonics(prn, highestLine), highestLine, CODE_TABLE_POINTS);
  if (made.size >= 64) made.clear(); // 256 kB each
  made.set(key, table);
  return table;
}

/** Table points per chip. */
export const POINTS_PER_CHIP = CODE_TABLE_POINTS / CA_LENGTH_CHIPS;
