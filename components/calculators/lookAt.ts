import { powerSpectrum, type Spectrum } from "@/lib/gnss/interference/spectrum";
import { selfLikeness, type SelfLikeness } from "@/lib/gnss/interference/selfLikeness";
import { mean } from "@/lib/numeric/statistics";
import { shownSpectrogram, type ShownSpectrogram } from "./shownSpectrogram";

export type LookSettings = {
  /** Of a transform of the averaged spectrum. */
  points: number;
  /** From the start, of the spectrogram. */
  stretchS: number;
};

/** A capture seen in four ways. */
export type Look = {
  settings: LookSettings;
  spectrum: Spectrum;
  spectrogram: ShownSpectrogram;
  /** Without the mean, which is the receiver's own line. */
  likeness: SelfLikeness;
  /** Mean |x|^2 of each stretch. */
  power: { stepS: number; values: Float64Array };
};

const LIKENESS_POINTS = 32_768;
const LONGEST_LAG_S = 1.2e-3; // one code and a little
const STRETCH = 8; // samples of the power in time

/** @param samples I and Q alternating, from 4 ms at 8 MHz on */
export function lookAt(samples: Int8Array, rateHz: number, settings: LookSettings): Look {
  const capture = { samples, complex: true, rateHz, ifHz: 0 };
  const { points, stretchS } = settings;
  return {
    settings,
    spectrum: powerSpectrum(capture, { points, window: "blackman-harris", step: oddStep(points) }),
    spectrogram: shownSpectrogram(capture, { fromS: 0, lengthS: stretchS }),
    likeness: selfLikeness(withoutMean(samples), rateHz, Math.round(LONGEST_LAG_S * rateHz), LIKENESS_POINTS),
    power: powerInTime(samples, rateHz),
  };
}

/** Odd, so that what repeats is not caught in the same part of its repetition by every transform. */
const oddStep = (points: number) => 2 * Math.round(0.2 * points) + 1;

function withoutMean(samples: Int8Array): Float64Array {
  const [i, q] = [0, 1].map((part) => mean(samples.filter((_, n) => n % 2 === part)));
  const rest = new Float64Array(samples.length);
  for (let n = 0; n < samples.length; n++) rest[n] = samples[n]! - (n % 2 === 0 ? i! : q!);
  return rest;
}

function powerInTime(samples: Int8Array, rateHz: number) {
  const values = new Float64Array(Math.floor(samples.length / 2 / STRETCH));
  for (let n = 0; n < values.length * 2 * STRETCH; n++)
    values[Math.floor(n / (2 * STRETCH))] += (samples[n]! * samples[n]!) / STRETCH;
  return { stepS: STRETCH / rateHz, values };
}
