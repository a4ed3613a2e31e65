import { gridOverview, type GridOverview } from "@/components/plots/gridOverview";
import { powerSpectrum, spectrogram, type Spectrum } from "@/lib/gnss/interference/spectrum";
import { selfLikeness, type SelfLikeness } from "@/lib/gnss/interference/selfLikeness";
import { median } from "@/lib/numeric/statistics";

export type LookSettings = {
  /** Of a transform of the averaged spectrum. */
  points: number;
  /** Of a transform of the spectra in time. */
  rowPoints: number;
};

/** A capture seen in four ways. */
export type Look = {
  settings: LookSettings;
  spectrum: Spectrum;
  inTime: {
    offsetsHz: Float64Array;
    timesS: Float64Array;
    resolutionHz: number;
    power: Float32Array;
    overview: GridOverview;
  };
  likeness: SelfLikeness;
  /** Mean |x|^2 of each stretch. */
  power: { stepS: number; values: Float64Array };
};

const ROWS = 240;
const LIKENESS_POINTS = 32_768;
const LONGEST_LAG_S = 1.2e-3; // one code and a little
const STRETCH = 8; // samples of the power in time

/** @param samples I and Q alternating, from 4 ms at 8 MHz on */
export function lookAt(samples: Int8Array, rateHz: number, settings: LookSettings): Look {
  const capture = { samples, complex: true, rateHz, ifHz: 0 };
  const { points, rowPoints } = settings;
  const spectrum = powerSpectrum(capture, { points, window: "blackman-harris", step: oddStep(points) });
  const first = { ...capture, samples: samples.subarray(0, 2 * rowPoints * Math.ceil((ROWS + 1) / 2)) };
  const rows = spectrogram(first, { points: rowPoints, window: "hann", step: rowPoints / 2 });
  const floor = median(rows.densityPerHz);
  const power = Float32Array.from(rows.densityPerHz, (density) => density / floor);
  return {
    settings,
    spectrum,
    inTime: {
      offsetsHz: rows.offsetsHz,
      timesS: rows.timesS,
      resolutionHz: rows.resolutionHz,
      power,
      overview: gridOverview(power, rows.offsetsHz.length),
    },
    likeness: selfLikeness(Float64Array.from(samples), rateHz, Math.round(LONGEST_LAG_S * rateHz), LIKENESS_POINTS),
    power: powerInTime(samples, rateHz),
  };
}

/** Odd, so that what repeats is not caught in the same part of its repetition by every transform. */
const oddStep = (points: number) => 2 * Math.round(0.2 * points) + 1;

function powerInTime(samples: Int8Array, rateHz: number) {
  const values = new Float64Array(Math.floor(samples.length / 2 / STRETCH));
  for (let n = 0; n < values.length * 2 * STRETCH; n++)
    values[Math.floor(n / (2 * STRETCH))] += (samples[n]! * samples[n]!) / STRETCH;
  return { stepS: STRETCH / rateHz, values };
}
