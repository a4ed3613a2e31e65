import { createFft } from "@/lib/numeric/fft";
import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import { CA_CHIP_RATE_HZ } from "./constants";
import { timesConjugate, transformSize } from "./exactCorrelation";
import type { Chips } from "./shiftRegister";

/**
 * Correlation over one code period when a arrives with another Doppler and the data bit changes where a period of b begins:
 * |sum over n of a[n] exp(2 pi i d n / Rc) b[(n + k) mod N] s|, with s = -1 where n + k runs past the end of b, else 1.
 * The layout of the transforms is that of `exactCorrelation`: nothing is cut or resampled.
 * @param a chips, +1 or -1, length N >= 2
 * @param b chips, +1 or -1, length N
 * @param dopplerHz Doppler of a minus Doppler of b
 * @returns length N, in chips, N for a full match; index is the lag k in chips
 */
export function flippedDopplerCorrelation(
  a: Chips,
  b: Chips,
  dopplerHz: number,
  chipRateHz = CA_CHIP_RATE_HZ,
): Float64Array {
  const length = a.length;
  if (length < 2 || b.length !== length)
    throw new RangeError(`flippedDopplerCorrelation: equal lengths from 2, got ${a.length}, ${b.length}`);
  const size = transformSize(length);
  const fft = createFft(size);
  const turned = new Float64Array(2 * size);
  const twice = new Float64Array(2 * size);
  for (let n = 0; n < length; n++) {
    const turns = (dopplerHz * n) / chipRateHz;
    turned[2 * n] = a[n] * cosTurns(turns);
    turned[2 * n + 1] = -a[n] * sinTurns(turns); // conjugate: `timesConjugate` takes b's spectrum as the conjugate one
    twice[2 * n] = b[n];
    if (n < length - 1) twice[2 * (n + length)] = -b[n];
  }
  const spectrum = new Float64Array(2 * size);
  const other = new Float64Array(2 * size);
  fft.transform(spectrum, turned);
  fft.transform(other, twice);
  timesConjugate(spectrum, spectrum, other);
  fft.transform(other, spectrum);
  return Float64Array.from(
    { length },
    (_, k) => Math.sqrt(other[2 * k] * other[2 * k] + other[2 * k + 1] * other[2 * k + 1]) / size,
  );
}
