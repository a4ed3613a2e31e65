import { cosTurns, decibels, sinTurns } from "@/lib/numeric/elementary";
import { bandLimitedCode, CODE_TABLE_POINTS, highestLineInBand, POINTS_PER_CHIP } from "./bandLimitedCode";
import { CA_LENGTH_CHIPS, L1_HZ } from "./constants";
import { samplesPerCodePeriod } from "./doppler";
import type { Capture } from "./searchSettings";

/** A signal found in a capture; code phase at the first sample. */
export type SignalEstimate = { codePhaseChips: number; dopplerHz: number; cn0DbHz: number };

const COHERENT_PERIODS = 4; // short enough that data bits of unknown edges cost little, long enough for a few hertz
const WIDE_TAPS = [-16, -12, -8, -4, 0, 4, 8, 12, 16]; // table points, 32 per chip: +-1/2 chip by 1/8
const NARROW_TAPS = [-8, -4, 0, 4, 8];
const NARROW_HALF_WIDTH_HZ = 60;
const DOPPLER_GRID_HZ = 10;

/**
 * Code phase, Doppler and C/N0 of a signal from its place in a search grid. The correlator uses the band-limited code,
 * follows the code Doppler from sample to sample and sums whole code periods, so that no bit edge falls inside one.
 * Code phase and Doppler: the largest sum of powers over 4 ms sums, with a parabola through the neighbours, twice.
 * C/N0: mean power of the 1 ms sums over all periods less the noise, over the noise; free of bin, step and bit losses.
 * @param coarse within 1/2 chip and `dopplerStepHz` of the signal
 * @param noisePower mean of I^2 + Q^2 of the noise per sample, counts^2
 */
export function refinePeak(
  capture: Capture,
  prn: number,
  coarse: { codePhaseChips: number; dopplerHz: number },
  dopplerStepHz: number,
  noisePower: number,
): SignalEstimate {
  const near = improve(capture, prn, coarse, WIDE_TAPS, dopplerStepHz);
  const { codePhaseChips, dopplerHz } = improve(capture, prn, near, NARROW_TAPS, NARROW_HALF_WIDTH_HZ);
  const [prompt] = periodSums(capture, prn, codePhaseChips, dopplerHz, [0]);
  let power = 0;
  for (const value of prompt) power += value * value;
  const noise = noisePower * samplesPerCodePeriod(capture.rateHz);
  const snr = Math.max(1e-3, power / (prompt.length / 2) / noise - 1);
  return { codePhaseChips, dopplerHz, cn0DbHz: decibels(snr * 1000) };
}

function improve(
  capture: Capture,
  prn: number,
  start: { codePhaseChips: number; dopplerHz: number },
  taps: readonly number[],
  halfWidthHz: number,
) {
  const sums = periodSums(capture, prn, start.codePhaseChips, start.dopplerHz, taps);
  const side = Math.ceil(halfWidthHz / DOPPLER_GRID_HZ);
  const power = (tap: number, step: number) => blockPower(sums[tap], (step * DOPPLER_GRID_HZ) / 1000);
  const best = { tap: 0, step: 0, power: -1 };
  for (let tap = 0; tap < taps.length; tap++) {
    for (let step = -side; step <= side; step++) {
      const value = power(tap, step);
      if (value > best.power) Object.assign(best, { tap, step, power: value });
    }
  }
  const inside = best.tap > 0 && best.tap < taps.length - 1;
  const tapShift = inside ? vertex(power(best.tap - 1, best.step), best.power, power(best.tap + 1, best.step)) : 0;
  const stepShift = vertex(power(best.tap, best.step - 1), best.power, power(best.tap, best.step + 1));
  const points = taps[best.tap] + tapShift * (taps[1] - taps[0]);
  const chips = start.codePhaseChips + points / POINTS_PER_CHIP;
  return {
    codePhaseChips: chips - Math.floor(chips / CA_LENGTH_CHIPS) * CA_LENGTH_CHIPS,
    dopplerHz: start.dopplerHz + (best.step + stepShift) * DOPPLER_GRID_HZ,
  };
}

/** Place of the vertex of the parabola through three equally spaced values, -1/2 to 1/2 from the middle one. */
function vertex(before: number, middle: number, after: number): number {
  const bend = before - 2 * middle + after;
  return bend < 0 ? Math.max(-0.5, Math.min(0.5, (before - after) / (2 * bend))) : 0;
}

/** Sum over blocks of four periods of |sum|^2 with the phase turning back by `turnsPerPeriod`. */
function blockPower(periods: Float64Array, turnsPerPeriod: number): number {
  const count = periods.length / 2;
  const length = Math.min(COHERENT_PERIODS, count);
  let power = 0;
  for (let block = 0; block + length <= count; block += length) {
    let re = 0;
    let im = 0;
    for (let m = 0; m < length; m++) {
      const c = cosTurns(m * turnsPerPeriod);
      const s = -sinTurns(m * turnsPerPeriod);
      const at = 2 * (block + m);
      re += periods[at] * c - periods[at + 1] * s;
      im += periods[at] * s + periods[at + 1] * c;
    }
    power += re * re + im * im;
  }
  return power;
}

/** Correlation over each whole code period at several taps: one list of complex sums per tap. */
function periodSums(
  { samples, rateHz }: Capture,
  prn: number,
  codePhaseChips: number,
  dopplerHz: number,
  taps: readonly number[],
): Float64Array[] {
  const perMs = samplesPerCodePeriod(rateHz);
  const total = samples.length / 2;
  const untilEpoch = Math.round(((CA_LENGTH_CHIPS - codePhaseChips) / CA_LENGTH_CHIPS) * perMs) % perMs;
  const first = untilEpoch + perMs <= total ? untilEpoch : 0;
  const count = Math.floor((total - first) / perMs);
  const table = bandLimitedCode(prn, highestLineInBand(perMs));
  const pointsPerSample = (CODE_TABLE_POINTS / perMs) * (1 + dopplerHz / L1_HZ);
  const stepRe = cosTurns(dopplerHz / rateHz);
  const stepIm = -sinTurns(dopplerHz / rateHz);
  const sums = taps.map(() => new Float64Array(2 * count));
  for (let m = 0; m < count; m++) {
    const from = first + m * perMs;
    const start = codePhaseChips * POINTS_PER_CHIP + from * pointsPerSample + CODE_TABLE_POINTS + 0.5; // 0.5 rounds
    let re = cosTurns((from * dopplerHz) / rateHz);
    let im = -sinTurns((from * dopplerHz) / rateHz);
    for (let n = 0; n < perMs; n++) {
      const i = samples[2 * (from + n)];
      const q = samples[2 * (from + n) + 1];
      const wipedRe = i * re - q * im;
      const wipedIm = i * im + q * re;
      const point = Math.floor(start + n * pointsPerSample);
      for (let tap = 0; tap < taps.length; tap++) {
        const code = table[(point + taps[tap]) & (CODE_TABLE_POINTS - 1)];
        sums[tap][2 * m] += wipedRe * code;
        sums[tap][2 * m + 1] += wipedIm * code;
      }
      const next = re * stepRe - im * stepIm;
      im = re * stepIm + im * stepRe;
      re = next;
    }
  }
  return sums;
}
