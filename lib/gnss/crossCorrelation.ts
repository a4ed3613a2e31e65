import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import { createDft } from "@/lib/numeric/dft";
import { CA_CHIP_RATE_HZ } from "./constants";
import type { Chips } from "./shiftRegister";

/**
 * Correlation of code a with code b when a arrives with another Doppler: |sum over n of a[n] exp(2 pi i d n / Rc)
 * b[(n + k) mod N]|, the sum running over all code periods of the coherent time, divided by their number. Chip-rate
 * samples; exact through the transform of length N (see `createDft`).
 * @param a chips, length N
 * @param b chips, length N
 * @param dopplerHz Doppler of a minus Doppler of b
 * @param coherentS a whole number of code periods, N / chip rate each
 * @returns length N, in chips, N for a full match; index is the lag k in chips
 */
export function dopplerCorrelation(
  a: Chips,
  b: Chips,
  dopplerHz: number,
  coherentS: number,
  chipRateHz = CA_CHIP_RATE_HZ,
): Float64Array {
  const length = a.length;
  if (length < 2 || b.length !== length)
    throw new RangeError(`dopplerCorrelation: equal lengths from 2, got ${a.length}, ${b.length}`);
  const periods = Math.round((coherentS * chipRateHz) / length);
  if (!(periods >= 1) || Math.abs((coherentS * chipRateHz) / length - periods) > 1e-6)
    throw new RangeError(`dopplerCorrelation: whole code periods from 1, got ${coherentS} s`);
  const turnsPerChip = dopplerHz / chipRateHz;
  const scale = periodFactor(turnsPerChip * length, periods);
  return Float64Array.from(onePeriod(a, b, turnsPerChip), (magnitude) => magnitude * scale);
}

/** Share of the amplitude that is left when the periods add up with a turning phase: |sum of exp(2 pi i m x)| / M. */
function periodFactor(turnsPerPeriod: number, periods: number): number {
  let re = 0;
  let im = 0;
  for (let m = 0; m < periods; m++) {
    re += cosTurns(m * turnsPerPeriod);
    im += sinTurns(m * turnsPerPeriod);
  }
  return Math.sqrt(re * re + im * im) / periods;
}

function onePeriod(a: Chips, b: Chips, turnsPerChip: number): Float64Array {
  const length = a.length;
  const dft = createDft(length);
  const turned = new Float64Array(2 * length);
  const plain = new Float64Array(2 * length);
  for (let n = 0; n < length; n++) {
    // Correlation is convolution with one code reversed: b enters as it is, a conjugated by reading it backwards.
    turned[2 * n] = a[n] * cosTurns(turnsPerChip * n);
    turned[2 * n + 1] = -a[n] * sinTurns(turnsPerChip * n);
    plain[2 * n] = b[n];
  }
  const spectrumA = new Float64Array(2 * length);
  const spectrumB = new Float64Array(2 * length);
  dft.transform(spectrumA, turned);
  dft.transform(spectrumB, plain);
  // With A the transform of conj(a): sum a b[n+k] = inverse transform of conj(A) B; its conjugate is the forward
  // transform of A conj(B), and only the magnitude is wanted.
  const product = new Float64Array(2 * length);
  for (let n = 0; n < 2 * length; n += 2) {
    product[n] = spectrumA[n] * spectrumB[n] + spectrumA[n + 1] * spectrumB[n + 1];
    product[n + 1] = spectrumA[n + 1] * spectrumB[n] - spectrumA[n] * spectrumB[n + 1];
  }
  dft.transform(plain, product);
  return Float64Array.from(
    { length },
    (_, k) => Math.sqrt(plain[2 * k] * plain[2 * k] + plain[2 * k + 1] * plain[2 * k + 1]) / length,
  );
}
