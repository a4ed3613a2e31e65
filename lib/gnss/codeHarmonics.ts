import { caCode } from "./caCode";
import { signalLines } from "./signalLines";

/**
 * Fourier series of a C/A code with rectangular chips, the lines being 1 kHz apart; see `signalLines`.
 * @param prn 1 to 37
 * @param highest largest k, from 0; C[-k] is the conjugate of C[k]
 * @returns complex C[0] to C[highest], real and imaginary parts alternating; the power of all lines is 1
 */
export const codeHarmonics = (prn: number, highest: number): Float64Array => signalLines(caCode(prn), 1, highest);
