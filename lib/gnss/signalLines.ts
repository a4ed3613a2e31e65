import { createDft } from "@/lib/numeric/dft";
import { cosTurns, PI, sinTurns } from "@/lib/numeric/elementary";
import type { Chips } from "./shiftRegister";

/**
 * Fourier series of a code on its chip pulse: c(t) = sum over k of C[k] exp(2 pi i k t / N), t in chips. C[k] is the
 * transform of the chips over N times the transform of one pulse, which lasts from n to n + 1.
 * @param chips one period of N chips
 * @param halves of one chip, of alternating sign: 1 for a plain chip (BPSK-R), 2 for the sine-phased subcarrier at the chip
 *   rate (BOC(1,1)), 12 for BOC(6,1)
 * @param highest largest k, from 0; C[-k] is the conjugate of C[k]
 * @returns complex C[0] to C[highest], real and imaginary parts alternating; the power of all lines is 1
 */
export function signalLines(chips: Chips, halves: number, highest: number): Float64Array {
  const length = chips.length;
  const scaled = new Float64Array(2 * length);
  chips.forEach((chip, n) => {
    scaled[2 * n] = chip / length;
  });
  const transform = new Float64Array(2 * length);
  createDft(length).transform(transform, scaled);
  const lines = new Float64Array(2 * highest + 2);
  for (let k = 0; k <= highest; k++) {
    const pulse = pulseOf(k / (2 * length), halves);
    const at = 2 * (k % length);
    lines[2 * k] = transform[at] * pulse.re - transform[at + 1] * pulse.im;
    lines[2 * k + 1] = transform[at] * pulse.im + transform[at + 1] * pulse.re;
  }
  return lines;
}

/** Transform of one pulse at a frequency of 2 * turns per chip. */
function pulseOf(turns: number, halves: number): { re: number; im: number } {
  if (turns === 0) return { re: halves % 2, im: 0 }; // an even number of halves has no mean
  const envelope = sinTurns(turns / halves) / (2 * PI * turns);
  let re = 0;
  let im = 0;
  for (let n = 0; n < halves; n++) {
    const middle = ((2 * n + 1) * turns) / halves;
    re += (n % 2 ? -1 : 1) * cosTurns(middle);
    im -= (n % 2 ? -1 : 1) * sinTurns(middle);
  }
  return { re: re * envelope, im: im * envelope };
}
