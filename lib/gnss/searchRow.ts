import { createFft } from "@/lib/numeric/fft";
import { codeHarmonics } from "./codeHarmonics";
import { SEARCH_LAGS } from "./searchSettings";

/** Conjugate lines of a code in the order of `createSignalSpectra`, and their power, 0.903: the share inside 1.023 MHz. */
export type CodeReplica = { readonly lines: Float64Array; readonly power: number };

export function codeReplica(prn: number): CodeReplica {
  const harmonics = codeHarmonics(prn, SEARCH_LAGS / 2 - 1);
  const lines = new Float64Array(2 * SEARCH_LAGS);
  let power = 0;
  for (let k = 0; k < SEARCH_LAGS / 2; k++) {
    const re = harmonics[2 * k];
    const im = harmonics[2 * k + 1];
    lines[2 * k] = re;
    lines[2 * k + 1] = -im;
    if (k > 0) {
      lines[lines.length - 2 * k] = re;
      lines[lines.length - 2 * k + 1] = im;
    }
    power += (k > 0 ? 2 : 1) * (re * re + im * im);
  }
  return { lines, power };
}

const product = new Float64Array(2 * SEARCH_LAGS);
const correlation = new Float64Array(2 * SEARCH_LAGS);

/**
 * Power of one Doppler row: sum over the coherent sums of |correlation|^2 at each of the 2048 code phases.
 * @param out length SEARCH_LAGS, overwritten; index n is the code phase n * 1023/2048 chips at the first sample
 */
export function searchRow(out: Float64Array, spectra: readonly Float64Array[], replica: CodeReplica): void {
  const fft = createFft(SEARCH_LAGS);
  out.fill(0);
  for (const spectrum of spectra) {
    multiply(product, spectrum, replica.lines);
    // Correlation at phase p: sum over k of conj(C[k]) Y[k] exp(-2 pi i k p/1023), a forward transform.
    fft.transform(correlation, product);
    addPower(out, correlation);
  }
}

function multiply(out: Float64Array, a: Float64Array, b: Float64Array): void {
  for (let n = 0; n < out.length; n += 2) {
    out[n] = a[n] * b[n] - a[n + 1] * b[n + 1];
    out[n + 1] = a[n] * b[n + 1] + a[n + 1] * b[n];
  }
}

function addPower(out: Float64Array, values: Float64Array): void {
  for (let n = 0; n < out.length; n++) out[n] += values[2 * n] * values[2 * n] + values[2 * n + 1] * values[2 * n + 1];
}
