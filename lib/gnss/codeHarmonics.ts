import { createDft } from "@/lib/numeric/dft";
import { cosTurns, PI, sinTurns } from "@/lib/numeric/elementary";
import { caCode } from "./caCode";
import { CA_LENGTH_CHIPS } from "./constants";

/**
 * Fourier series of a C/A code with rectangular chips: c(t) = sum over k of C[k] exp(2 pi i k t / 1023), t in chips, the
 * lines being 1 kHz apart. C[k] is the transform of the chips over 1023 times sin(x)/x at x = pi k/1023, turned by half a
 * chip because a chip lasts from n to n + 1.
 * @param prn 1 to 37
 * @param highest largest k, from 0; C[-k] is the conjugate of C[k]
 * @returns complex C[0] to C[highest], real and imaginary parts alternating; the power of all lines is 1
 */
export function codeHarmonics(prn: number, highest: number): Float64Array {
  const chips = new Float64Array(2 * CA_LENGTH_CHIPS);
  caCode(prn).forEach((chip, n) => {
    chips[2 * n] = chip / CA_LENGTH_CHIPS;
  });
  const lines = new Float64Array(2 * CA_LENGTH_CHIPS);
  createDft(CA_LENGTH_CHIPS).transform(lines, chips);
  const harmonics = new Float64Array(2 * highest + 2);
  for (let k = 0; k <= highest; k++) {
    const turns = k / (2 * CA_LENGTH_CHIPS);
    const envelope = k === 0 ? 1 : sinTurns(turns) / (2 * PI * turns);
    const re = cosTurns(turns) * envelope;
    const im = -sinTurns(turns) * envelope;
    const at = 2 * (k % CA_LENGTH_CHIPS);
    harmonics[2 * k] = lines[at] * re - lines[at + 1] * im;
    harmonics[2 * k + 1] = lines[at] * im + lines[at + 1] * re;
  }
  return harmonics;
}
