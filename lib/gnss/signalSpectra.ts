import { createDft } from "@/lib/numeric/dft";
import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import { CA_LENGTH_CHIPS } from "./constants";
import { codeDopplerChipsPerS, samplesPerCodePeriod } from "./doppler";
import { SEARCH_LAGS, type Capture, type SearchSettings } from "./searchSettings";

const HIGHEST_LINE = SEARCH_LAGS / 2 - 1; // kHz; C/A lines beyond 1023 kHz are left out of the search
const ANCHOR = 512; // the turning phase is computed afresh this often, so that rounding does not pile up

/**
 * Spectra of the coherent sums of a capture for one Doppler at a time; they serve all codes.
 * - The carrier is taken off, and the milliseconds of one coherent sum are added up, for the code repeats each of them.
 * - The transform has the true length of a code period in samples (2046, 4092 ...), so nothing is padded or resampled and
 *   the product with a code's lines is its circular correlation exactly, at any delay.
 * - Only the lines up to 1023 kHz are kept, which fit a transform of 2048 lags. It costs 0.2 dB at 4.092 MHz (power of
 *   a C/A code inside +-1.023 MHz: 0.903, inside +-2.046 MHz: 0.950) and nothing at 2.046 MHz.
 * - The code's own Doppler is undone from sum to sum by turning the lines.
 */
export function createSignalSpectra(capture: Capture, settings: SearchSettings) {
  const perMs = samplesPerCodePeriod(capture.rateHz);
  const { coherentMs, sums } = settings;
  const dft = createDft(perMs);
  const carrier = new Float64Array(2 * perMs * coherentMs);
  const folded = new Float64Array(2 * perMs);
  const lines = new Float64Array(2 * perMs);
  /** One spectrum of SEARCH_LAGS complex lines per sum: 0 to 1023 kHz, a gap, -1023 to -1 kHz. */
  const spectra = Array.from({ length: sums }, () => new Float64Array(2 * SEARCH_LAGS));

  const load = (dopplerHz: number): readonly Float64Array[] => {
    fillCarrier(carrier, -dopplerHz / capture.rateHz);
    for (let sum = 0; sum < sums; sum++) {
      fold(folded, capture.samples, sum * carrier.length, carrier);
      dft.transform(lines, folded);
      const middleS = ((sum + 0.5) * coherentMs) / 1000;
      turnLines(spectra[sum], lines, (codeDopplerChipsPerS(dopplerHz) * middleS) / CA_LENGTH_CHIPS);
    }
    return spectra;
  };
  return { load };
}

function fillCarrier(carrier: Float64Array, turnsPerSample: number): void {
  const stepRe = cosTurns(turnsPerSample);
  const stepIm = sinTurns(turnsPerSample);
  let re = 1;
  let im = 0;
  for (let n = 0; n < carrier.length / 2; n++) {
    if (n % ANCHOR === 0) {
      re = cosTurns(n * turnsPerSample);
      im = sinTurns(n * turnsPerSample);
    }
    carrier[2 * n] = re;
    carrier[2 * n + 1] = im;
    const next = re * stepRe - im * stepIm;
    im = re * stepIm + im * stepRe;
    re = next;
  }
}

function fold(folded: Float64Array, samples: Int8Array, start: number, carrier: Float64Array): void {
  folded.fill(0);
  for (let at = 0; at < carrier.length; at += folded.length) {
    for (let n = 0; n < folded.length; n += 2) {
      const i = samples[start + at + n];
      const q = samples[start + at + n + 1];
      const re = carrier[at + n];
      const im = carrier[at + n + 1];
      folded[n] += i * re - q * im;
      folded[n + 1] += i * im + q * re;
    }
  }
}

/** Copies the lines -1023 to 1023 and turns line k by -k * turns: the code was that much further on. */
function turnLines(out: Float64Array, lines: Float64Array, turns: number): void {
  const stepRe = cosTurns(turns);
  const stepIm = -sinTurns(turns);
  let re = 1;
  let im = 0;
  for (let k = 0; k <= HIGHEST_LINE; k++) {
    out[2 * k] = lines[2 * k] * re - lines[2 * k + 1] * im;
    out[2 * k + 1] = lines[2 * k] * im + lines[2 * k + 1] * re;
    if (k > 0) {
      const from = lines.length - 2 * k;
      const to = out.length - 2 * k;
      out[to] = lines[from] * re + lines[from + 1] * im;
      out[to + 1] = lines[from + 1] * re - lines[from] * im;
    }
    const next = re * stepRe - im * stepIm;
    im = re * stepIm + im * stepRe;
    re = next;
  }
}
