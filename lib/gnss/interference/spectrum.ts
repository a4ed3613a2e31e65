import { createFft } from "@/lib/numeric/fft";
import { sampleCount, type SampledCapture } from "../search/sampledCapture";
import { windowOf, type WindowName } from "./window";

/** How a spectrum is taken. */
export type SpectrumSettings = {
  /** Points of one transform, a power of two from 4. */
  points: number;
  window: WindowName;
  /** Samples from the start of one transform to the start of the next. */
  step: number;
};

/** Power over frequency. */
export type Spectrum = {
  /** From the nominal carrier, lowest first. */
  offsetsHz: Float64Array;
  /** Mean |x|^2 per Hz, in squared units of the samples. */
  densityPerHz: Float64Array;
  /** Resolution bandwidth: the noise bandwidth of one bin behind the window. */
  resolutionHz: number;
  /** Transforms averaged. */
  averaged: number;
};

/** Spectra in time. */
export type Spectrogram = Omit<Spectrum, "averaged"> & {
  /** Middle of each row from the capture's start. */
  timesS: Float64Array;
};

/**
 * Spectrum of a capture by averaged windowed transforms: Welch, "The use of fast Fourier transform for the estimation
 * of power spectra" (1967). The sum of density times bin width is the mean power of the samples. Real samples give the
 * half of the spectrum from 0 Hz up, with the power of both.
 */
export function powerSpectrum(capture: SampledCapture, settings: SpectrumSettings): Spectrum {
  let averaged = 0;
  let sum: Float64Array | null = null;
  const { axis } = transformRows(capture, settings, (row) => {
    sum ??= new Float64Array(row.length);
    for (let k = 0; k < row.length; k++) sum[k] += row[k];
    averaged += 1;
  });
  return { ...axis, densityPerHz: sum!.map((value) => value / averaged), averaged };
}

/**
 * Spectra of a capture one after the other, `step` samples apart. Each row stands for `points` samples, so time is
 * resolved to points/rate and frequency to the resolution bandwidth.
 * @returns densities row after row, offsetsHz.length each
 */
export function spectrogram(capture: SampledCapture, settings: SpectrumSettings): Spectrogram {
  const rows: Float64Array[] = [];
  const times: number[] = [];
  const { axis } = transformRows(capture, settings, (row, first) => {
    rows.push(row.slice());
    times.push((first + settings.points / 2) / capture.rateHz);
  });
  const densityPerHz = new Float64Array(rows.length * axis.offsetsHz.length);
  rows.forEach((row, n) => densityPerHz.set(row, n * row.length));
  return { ...axis, densityPerHz, timesS: Float64Array.from(times) };
}

function transformRows(
  capture: SampledCapture,
  { points, window, step }: SpectrumSettings,
  take: (row: Float64Array, first: number) => void,
): { axis: Pick<Spectrum, "offsetsHz" | "resolutionHz"> } {
  const { samples, complex, rateHz, ifHz } = capture;
  const total = sampleCount(capture);
  if (!(Number.isInteger(step) && step >= 1)) throw new RangeError(`spectrum: step of 1 sample at least, got ${step}`);
  if (points > total) throw new RangeError(`spectrum: at most the capture's ${total} points, got ${points}`);
  const { values, noiseBandwidthBins } = windowOf(window, points);
  const power = values.reduce((sum, value) => sum + value * value, 0);
  const fft = createFft(points);
  const data = new Float64Array(2 * points);
  const lines = new Float64Array(2 * points);
  const lowest = complex ? -points / 2 : 0;
  const count = complex ? points : points / 2 + 1;
  const row = new Float64Array(count);
  for (let first = 0; first + points <= total; first += step) {
    for (let n = 0; n < points; n++) {
      const at = first + n;
      data[2 * n] = values[n] * (complex ? samples[2 * at] : samples[at]);
      data[2 * n + 1] = complex ? values[n] * samples[2 * at + 1] : 0;
    }
    fft.transform(lines, data);
    for (let k = 0; k < count; k++) {
      const at = 2 * ((k + lowest + points) % points);
      const doubled = complex || k === 0 || k === points / 2 ? 1 : 2;
      row[k] = (doubled * (lines[at] * lines[at] + lines[at + 1] * lines[at + 1])) / (power * rateHz);
    }
    take(row, first);
  }
  return {
    axis: {
      offsetsHz: Float64Array.from({ length: count }, (_, k) => ((k + lowest) * rateHz) / points - ifHz),
      resolutionHz: (noiseBandwidthBins * rateHz) / points,
    },
  };
}
