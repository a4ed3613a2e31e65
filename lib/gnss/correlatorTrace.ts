import { createDft } from "@/lib/numeric/dft";
import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { caCode } from "./caCode";
import { CA_LENGTH_CHIPS } from "./constants";
import { circularCorrelation } from "./correlation";
import { coherentSnr } from "./detection";

/** Points of a trace per chip. */
export const TRACE_POINTS_PER_CHIP = 8;
const POINTS = CA_LENGTH_CHIPS * TRACE_POINTS_PER_CHIP;

/**
 * What a bench correlator shows for one satellite: |R| against lag, 8 points per chip over one code period.
 * The signal part is the autocorrelation of the rectangular code, exact at any delay. The noise part is white noise at
 * 8.184 MHz really correlated with the code, so neighbouring lags share noise as in an instrument. Adding up the
 * milliseconds of the coherent time first and correlating once is equal in law to correlating them all, and faster.
 * @param delayChips of the signal, 0 <= delay < 1023: the peak stands at this lag
 * @param cn0DbHz null for noise alone
 * @param coherentMs whole milliseconds, 1 to 20
 * @returns length 8184; index n is the lag n/8 chips; in units of sigma, the noise in I or Q, so that the peak is about
 *   sqrt(2 * C/N0 * T) and noise alone has mean sqrt(pi/2)
 */
export function correlatorTrace(input: {
  prn: number;
  delayChips: number;
  cn0DbHz: number | null;
  coherentMs: number;
  random: Random;
}): Float64Array {
  const { prn, delayChips, cn0DbHz, coherentMs, random } = input;
  if (!(delayChips >= 0 && delayChips < CA_LENGTH_CHIPS))
    throw new RangeError(`correlatorTrace: delay from 0 below 1023 chips, got ${delayChips}`);
  if (!(Number.isInteger(coherentMs) && coherentMs >= 1 && coherentMs <= 20))
    throw new RangeError(`correlatorTrace: 1 to 20 whole milliseconds, got ${coherentMs}`);
  const carrierTurns = random.uniform();
  const noise = correlatedNoise(prn, random);
  const peak = cn0DbHz === null ? 0 : Math.sqrt(2 * coherentSnr(cn0DbHz, coherentMs / 1000)) / CA_LENGTH_CHIPS;
  const [peakRe, peakIm] = [peak * cosTurns(carrierTurns), peak * sinTurns(carrierTurns)];
  const auto = autocorrelation(prn);
  return Float64Array.from({ length: POINTS }, (_, n) => {
    const level = between(auto, n / TRACE_POINTS_PER_CHIP - delayChips);
    const re = noise[2 * n] + level * peakRe;
    const im = noise[2 * n + 1] + level * peakIm;
    return Math.sqrt(re * re + im * im);
  });
}

const made = new Map<number, Int32Array>();

function autocorrelation(prn: number): Int32Array {
  const values = made.get(prn) ?? circularCorrelation(caCode(prn), caCode(prn));
  made.set(prn, values);
  return values;
}

/** The correlation of rectangular chips is straight between whole lags. */
function between(values: Int32Array, lag: number): number {
  const below = Math.floor(lag);
  const at = below < 0 ? below + values.length : below;
  const next = values[at + 1 === values.length ? 0 : at + 1];
  return values[at] + (lag - below) * (next - values[at]);
}

/** White complex noise correlated with the code at all lags, real and imaginary parts alternating, variance 1 each. */
function correlatedNoise(prn: number, random: Random): Float64Array {
  const white = Float64Array.from({ length: 2 * POINTS }, () => random.gaussian());
  const dft = createDft(CA_LENGTH_CHIPS);
  const lines = codeLines(prn);
  const chips = new Float64Array(2 * CA_LENGTH_CHIPS);
  const spectrum = new Float64Array(2 * CA_LENGTH_CHIPS);
  const noise = new Float64Array(2 * POINTS);
  const scale = 1 / (CA_LENGTH_CHIPS * Math.sqrt(POINTS));
  // A chip spans eight samples, so lags of equal remainder after division by eight are a correlation of chip sums.
  for (let remainder = 0; remainder < TRACE_POINTS_PER_CHIP; remainder++) {
    sumChips(chips, white, remainder);
    dft.transform(spectrum, chips);
    for (let k = 0; k < 2 * CA_LENGTH_CHIPS; k += 2) {
      // conj(U conj(C)) = conj(U) C: the forward transform then gives the conjugate of the correlation
      const re = spectrum[k] * lines[k] + spectrum[k + 1] * lines[k + 1];
      const im = spectrum[k] * lines[k + 1] - spectrum[k + 1] * lines[k];
      spectrum[k] = re;
      spectrum[k + 1] = im;
    }
    dft.transform(chips, spectrum);
    for (let q = 0; q < CA_LENGTH_CHIPS; q++) {
      const at = 2 * (TRACE_POINTS_PER_CHIP * q + remainder);
      noise[at] = chips[2 * q] * scale;
      noise[at + 1] = -chips[2 * q + 1] * scale;
    }
  }
  return noise;
}

function sumChips(chips: Float64Array, white: Float64Array, remainder: number): void {
  chips.fill(0);
  for (let n = 0; n < POINTS; n++) {
    const from = 2 * ((n + remainder) % POINTS);
    const to = 2 * Math.floor(n / TRACE_POINTS_PER_CHIP);
    chips[to] += white[from];
    chips[to + 1] += white[from + 1];
  }
}

function codeLines(prn: number): Float64Array {
  const chips = new Float64Array(2 * CA_LENGTH_CHIPS);
  caCode(prn).forEach((chip, n) => {
    chips[2 * n] = chip;
  });
  const lines = new Float64Array(2 * CA_LENGTH_CHIPS);
  createDft(CA_LENGTH_CHIPS).transform(lines, chips);
  return lines;
}
