import { createDft } from "@/lib/numeric/dft";
import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import { timesConjugate } from "./exactCorrelation";
import type { Chips } from "./shiftRegister";

/**
 * Correlates every two codes of a set with a Doppler difference over one period, |sum over n of a[n] b[(n + k) mod N]
 * exp(2 pi i d n / Rc)|, and hands the values of each pair to `visit` before the next one is computed: the values of all
 * pairs together would not fit into memory for long codes. The spectra are made once a code, not once a pair.
 * Codes are real, so the opposite difference has the same magnitudes.
 * @param visit indices of the two codes, the first below the second, and N magnitudes in chips, overwritten afterwards
 */
export function dopplerPairs(
  codes: readonly Chips[],
  dopplerHz: number,
  chipRateHz: number,
  visit: (a: number, b: number, magnitudes: Float64Array) => void,
): void {
  const length = codes[0]?.length ?? 0;
  if (length < 2 || codes.some((code) => code.length !== length))
    throw new RangeError(`dopplerPairs: codes of one length from 2, got ${codes.map((code) => code.length).join()}`);
  const turnsPerChip = dopplerHz / chipRateHz;
  const plain = codes.map((code) => spectrum(code, 0));
  const turned = codes.map((code) => spectrum(code, -turnsPerChip)); // conj(a exp(..)) has a exp(-..): a is real
  const dft = createDft(length);
  const product = new Float64Array(2 * length);
  const lags = new Float64Array(2 * length);
  const magnitudes = new Float64Array(length);
  for (let a = 0; a < codes.length; a++)
    for (let b = a + 1; b < codes.length; b++) {
      timesConjugate(product, turned[a], plain[b]);
      dft.transform(lags, product);
      for (let k = 0; k < length; k++)
        magnitudes[k] = Math.sqrt(lags[2 * k] * lags[2 * k] + lags[2 * k + 1] * lags[2 * k + 1]) / length;
      visit(a, b, magnitudes);
    }
}

function spectrum(code: Chips, turnsPerChip: number): Float64Array {
  const turned = new Float64Array(2 * code.length);
  code.forEach((chip, n) => {
    turned[2 * n] = chip * cosTurns(turnsPerChip * n);
    turned[2 * n + 1] = chip * sinTurns(turnsPerChip * n);
  });
  const lines = new Float64Array(2 * code.length);
  createDft(code.length).transform(lines, turned);
  return lines;
}
