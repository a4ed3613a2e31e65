import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import { createFft } from "@/lib/numeric/fft";
import { sampleCount, type SampledCapture } from "./sampledCapture";

/** Where sums lie in a capture: they follow each other from `startS`, each `lengthS` long. */
export type SumTimes = { startS: number; lengthS: number; sums: number };

/** Lines of a stretch of the capture for one Doppler: line k stands at 2 * (middle + k). Do not write into them. */
export type TunedLines = { middle: number; line(sum: number): Float64Array };

const ANCHOR = 256; // a turning phase is computed afresh this often, so that rounding does not pile up
const MOST_KEPT_BYTES = 32e6;

/**
 * Spectral lines of stretches of a capture: Y[k] = sum over the samples of x[n] exp(-2 pi i (f + k F) n / fs), k from
 * -highest to highest, for any frequency f and spacing F whatever the rate. The lines of a code that repeats F times a second
 * fall there, so that the product with the code's own lines is the correlation with the code at any delay, exactly, without
 * resampling and without a whole number of samples in a period.
 * Frequencies that differ by whole spacings share their lines, which are kept as long as they fit into 32 MB.
 * The sum is done as a convolution with a chirp (k n = (k^2 + n^2 - (k-n)^2)/2; Rabiner, Schafer & Rader, "The chirp
 * z-transform algorithm", 1969) in blocks that share one power-of-two transform.
 * @param reach frequencies of up to this many spacings from the carrier share lines
 */
export function createReceivedLines(
  capture: SampledCapture,
  spacingHz: number,
  highest: number,
  reach: number,
  times: SumTimes,
): (dopplerHz: number) => TunedLines {
  const { rateHz } = capture;
  const count = 2 * (highest + reach) + 1;
  const size = sizeFor(count, Math.ceil(times.lengthS * rateHz) + 1);
  const blockLength = size - count + 1;
  const turnsPerSample = spacingHz / rateHz;
  const fft = createFft(size);
  const filter = chirpSpectrum(turnsPerSample, count, blockLength, size);
  const back = backChirp(turnsPerSample, count);
  const front = new Float64Array(2 * blockLength);
  const padded = new Float64Array(2 * size);
  const spectrum = new Float64Array(2 * size);
  const held = sampleCount(capture);
  const firstSample = (sum: number) => Math.min(held, Math.round((times.startS + sum * times.lengthS) * rateHz));
  if ((times.startS + times.sums * times.lengthS) * rateHz >= held + 1)
    throw new RangeError(
      `createReceivedLines: ${times.sums} x ${times.lengthS} s from ${times.startS} s pass the capture's end`,
    );

  let tunedHz = NaN;
  const load = (out: Float64Array, sum: number, centreHz: number): Float64Array => {
    const lowestTurns = (capture.ifHz + centreHz) / rateHz - (highest + reach) * turnsPerSample;
    if (tunedHz !== centreHz) fillFront(front, lowestTurns, turnsPerSample);
    tunedHz = centreHz;
    out.fill(0);
    for (let at = firstSample(sum); at < firstSample(sum + 1); at += blockLength) {
      const length = Math.min(blockLength, firstSample(sum + 1) - at);
      padded.fill(0);
      if (capture.complex) frontComplex(padded, capture.samples, at, length, front);
      else frontReal(padded, capture.samples, at, length, front);
      fft.transform(spectrum, padded);
      multiplyInto(spectrum, filter);
      fft.inverseTransform(padded, spectrum);
      addTurned(out, padded, back, lowestTurns * at, turnsPerSample * at);
    }
    return out;
  };

  const kept: { centreHz: number; lines: Float64Array[] }[] = [];
  const mayKeep = Math.floor(MOST_KEPT_BYTES / (16 * count * times.sums));
  return (dopplerHz) => {
    const whole = Math.round(dopplerHz / spacingHz - 1e-6); // half a spacing always falls to the same side
    const shift = Math.abs(whole) <= reach ? whole : 0;
    const centreHz = dopplerHz - shift * spacingHz;
    const middle = highest + reach + shift;
    if (mayKeep === 0) return { middle, line: (sum) => load(new Float64Array(2 * count), sum, centreHz) };
    let found = kept.find((one) => Math.abs(one.centreHz - centreHz) < 1e-6);
    if (!found) {
      found = { centreHz, lines: [] };
      if (kept.length >= mayKeep) kept.shift();
      kept.push(found);
    }
    const { lines } = found;
    return { middle, line: (sum) => (lines[sum] ??= load(new Float64Array(2 * count), sum, centreHz)) };
  };
}

/** The transform that costs least per sample, no longer than one sum needs. */
function sizeFor(count: number, longest: number): number {
  let size = 16;
  while (size < 3 * count && size < count + longest) size *= 2;
  return size;
}

/** exp(-2 pi i n (lowest + n spacing / 2)): carrier and chirp in one. */
function fillFront(front: Float64Array, lowestTurns: number, turnsPerSample: number): void {
  for (let n = 0; n < front.length / 2; n++) {
    const turns = n * (lowestTurns + (n * turnsPerSample) / 2);
    front[2 * n] = cosTurns(turns);
    front[2 * n + 1] = -sinTurns(turns);
  }
}

/** Transform of exp(+pi i spacing n^2), n from 1 - blockLength to count - 1. */
function chirpSpectrum(turnsPerSample: number, count: number, blockLength: number, size: number): Float64Array {
  const chirp = new Float64Array(2 * size);
  for (let n = 1 - blockLength; n < count; n++) {
    const turns = (n * n * turnsPerSample) / 2;
    const at = 2 * (n < 0 ? n + size : n);
    chirp[at] = cosTurns(turns);
    chirp[at + 1] = sinTurns(turns);
  }
  const spectrum = new Float64Array(2 * size);
  createFft(size).transform(spectrum, chirp);
  return spectrum;
}

type Samples = SampledCapture["samples"];

function frontComplex(out: Float64Array, samples: Samples, at: number, length: number, front: Float64Array): void {
  for (let n = 0; n < 2 * length; n += 2) {
    const i = samples[2 * at + n];
    const q = samples[2 * at + n + 1];
    out[n] = i * front[n] - q * front[n + 1];
    out[n + 1] = i * front[n + 1] + q * front[n];
  }
}

function frontReal(out: Float64Array, samples: Samples, at: number, length: number, front: Float64Array): void {
  for (let n = 0; n < length; n++) {
    const value = samples[at + n];
    out[2 * n] = value * front[2 * n];
    out[2 * n + 1] = value * front[2 * n + 1];
  }
}

function multiplyInto(a: Float64Array, b: Float64Array): void {
  for (let n = 0; n < a.length; n += 2) {
    const re = a[n] * b[n] - a[n + 1] * b[n + 1];
    a[n + 1] = a[n] * b[n + 1] + a[n + 1] * b[n];
    a[n] = re;
  }
}

/** exp(-pi i spacing k^2), which completes the convolution. */
function backChirp(turnsPerSample: number, count: number): Float64Array {
  const chirp = new Float64Array(2 * count);
  for (let k = 0; k < count; k++) {
    const turns = (k * k * turnsPerSample) / 2;
    chirp[2 * k] = cosTurns(turns);
    chirp[2 * k + 1] = -sinTurns(turns);
  }
  return chirp;
}

/** Adds the lines, each turned back by the phase that it has gained at the block's first sample. */
function addTurned(
  out: Float64Array,
  lines: Float64Array,
  back: Float64Array,
  startTurns: number,
  stepTurns: number,
): void {
  const stepRe = cosTurns(stepTurns);
  const stepIm = -sinTurns(stepTurns);
  let re = 1;
  let im = 0;
  for (let k = 0; k < back.length / 2; k++) {
    if (k % ANCHOR === 0) {
      re = cosTurns(startTurns + k * stepTurns);
      im = -sinTurns(startTurns + k * stepTurns);
    }
    const c = re * back[2 * k] - im * back[2 * k + 1];
    const s = re * back[2 * k + 1] + im * back[2 * k];
    out[2 * k] += lines[2 * k] * c - lines[2 * k + 1] * s;
    out[2 * k + 1] += lines[2 * k] * s + lines[2 * k + 1] * c;
    const next = re * stepRe - im * stepIm;
    im = re * stepIm + im * stepRe;
    re = next;
  }
}
