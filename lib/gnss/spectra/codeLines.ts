import { decibels } from "@/lib/numeric/elementary";
import { codeHarmonics } from "../codeHarmonics";

/** One line of a code's spectrum; its power as a share of the code's in dB. */
export type CodeLine = { offsetKhz: number; levelDb: number };

/** Lines of a C/A code beside the carrier, 1 kHz apart: |DFT_k/1023|^2 sinc^2(k/1023). The same on both sides. */
export function codeLines(prn: number, highestKhz: number): CodeLine[] {
  const harmonics = codeHarmonics(prn, highestKhz);
  return Array.from({ length: highestKhz }, (_, n) => {
    const at = 2 * (n + 1);
    return {
      offsetKhz: n + 1,
      levelDb: decibels(harmonics[at] * harmonics[at] + harmonics[at + 1] * harmonics[at + 1]),
    };
  });
}

/**
 * Strongest line of a C/A code, where a narrow interference does most harm. Parkinson & Spilker, "Global Positioning
 * System: Theory and Applications", and Kaplan & Hegarty, "Understanding GPS", list them for the first satellites.
 */
export const worstCodeLine = (prn: number): CodeLine =>
  codeLines(prn, 511).reduce((worst, line) => (line.levelDb > worst.levelDb ? line : worst));
