import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import { solveSymmetric } from "@/lib/numeric/solveSymmetric";
import type { MutableCapture } from "./blankPulses";
import { codeDriftChipsPerS, lineSpacingHz, type SearchSignal } from "./searchSignal";
import { filteredWaveform, hardWaveform, type SignalWaveform } from "./signalWaveform";

const TAPS = 7; // of the filter that is fitted to the front end, one sample apart
const CODE_STEPS = 6; // on either side of the code phase that the search gives
const CODE_STEP_CHIPS = 0.01;
const ROUNDS = 2;
const ANCHOR = 256;

/**
 * Takes one signal out of the samples, in place. Its waveform is rebuilt from the code, once with hard chips and once filtered
 * to the capture's band; the code phase is refined, a short filter is fitted to what the front end made of it, and each code
 * period has its own complex amplitude, so that neither data bits nor a small error of Doppler matter. The better of the two
 * waveforms is subtracted.
 * @param place code phase at the first sample and Doppler, as a search gives them
 */
export function cancelSignal(
  capture: MutableCapture,
  signal: SearchSignal,
  prn: number,
  place: { codePhaseChips: number; dopplerHz: number },
): void {
  const highest = Math.floor((0.5 * capture.rateHz) / lineSpacingHz(signal));
  const wiped = wipeCarrier(capture, place.dopplerHz);
  const fits = [hardWaveform(signal, prn), filteredWaveform(signal, prn, highest)].map((waveform) =>
    fitWaveform(wiped, capture.rateHz, signal, waveform, place),
  );
  const best = fits[0].energy >= fits[1].energy ? fits[0] : fits[1];
  subtract(capture, place.dopplerHz, best.model);
}

/** Samples turned to zero carrier, I and Q alternating; of a real capture twice its positive half. */
function wipeCarrier({ samples, complex, rateHz, ifHz }: MutableCapture, dopplerHz: number): Float32Array {
  const out = new Float32Array(complex ? samples.length : 2 * samples.length);
  turning((ifHz + dopplerHz) / rateHz, out.length / 2, (n, c, s) => {
    const i = complex ? samples[2 * n] : 2 * samples[n];
    const q = complex ? samples[2 * n + 1] : 0;
    out[2 * n] = i * c + q * s;
    out[2 * n + 1] = q * c - i * s;
  });
  return out;
}

function subtract({ samples, complex, rateHz, ifHz }: MutableCapture, dopplerHz: number, model: Float32Array): void {
  turning((ifHz + dopplerHz) / rateHz, model.length / 2, (n, c, s) => {
    const re = model[2 * n] * c - model[2 * n + 1] * s;
    if (!complex) samples[n] -= re;
    else {
      samples[2 * n] -= re;
      samples[2 * n + 1] -= model[2 * n] * s + model[2 * n + 1] * c;
    }
  });
}

/** Visits every sample with the cosine and sine of its carrier phase. */
function turning(turnsPerSample: number, count: number, visit: (n: number, c: number, s: number) => void): void {
  const stepRe = cosTurns(turnsPerSample);
  const stepIm = sinTurns(turnsPerSample);
  let c = 1;
  let s = 0;
  for (let n = 0; n < count; n++) {
    if (n % ANCHOR === 0) {
      c = cosTurns(n * turnsPerSample);
      s = sinTurns(n * turnsPerSample);
    }
    visit(n, c, s);
    const next = c * stepRe - s * stepIm;
    s = c * stepIm + s * stepRe;
    c = next;
  }
}

type Fit = { model: Float32Array; energy: number };

function fitWaveform(
  wiped: Float32Array,
  rateHz: number,
  signal: SearchSignal,
  waveform: SignalWaveform,
  { codePhaseChips, dopplerHz }: { codePhaseChips: number; dopplerHz: number },
): Fit {
  const count = wiped.length / 2;
  const chipsPerSample = (signal.chipRateHz + codeDriftChipsPerS(signal, dopplerHz)) / rateHz;
  const starts = periodStarts(codePhaseChips, chipsPerSample, signal.lengthChips, count);
  const replica = new Float32Array(count);
  const energyAt = (offsetChips: number): number => {
    fillReplica(replica, waveform, codePhaseChips + offsetChips, chipsPerSample);
    return correlationEnergy(wiped, replica, starts);
  };
  let best = { offset: 0, energy: -1 };
  for (let n = -CODE_STEPS; n <= CODE_STEPS; n++) {
    const offset = n * CODE_STEP_CHIPS;
    const energy = energyAt(offset);
    if (energy > best.energy) best = { offset, energy };
  }
  fillReplica(replica, waveform, codePhaseChips + best.offset, chipsPerSample);
  let shaped: Float32Array = interleaved(replica);
  let amplitudes = periodAmplitudes(wiped, shaped, starts);
  for (let round = 0; round < ROUNDS; round++) {
    shaped = filtered(replica, fitTaps(wiped, replica, amplitudes, starts));
    amplitudes = periodAmplitudes(wiped, shaped, starts);
  }
  return scaled(shaped, amplitudes, starts);
}

/** Sample numbers at which a code period begins, with the first and the one behind the last sample as ends. */
function periodStarts(codePhaseChips: number, chipsPerSample: number, lengthChips: number, count: number): number[] {
  const starts = [0];
  for (let period = 1; ; period++) {
    const at = Math.ceil((period * lengthChips - codePhaseChips) / chipsPerSample);
    if (at >= count) break;
    if (at > 0) starts.push(at);
  }
  return [...starts, count];
}

function fillReplica(out: Float32Array, waveform: SignalWaveform, chips: number, chipsPerSample: number): void {
  const { values, pointsPerChip } = waveform;
  const step = chipsPerSample * pointsPerChip;
  let point = chips * pointsPerChip;
  point -= values.length * Math.floor(point / values.length);
  for (let n = 0; n < out.length; n++) {
    out[n] = values[point | 0];
    point += step;
    if (point >= values.length) point -= values.length;
  }
}

/** Sum over the periods of |correlation|^2 / energy of the replica: what one amplitude a period can explain. */
function correlationEnergy(wiped: Float32Array, replica: Float32Array, starts: readonly number[]): number {
  let energy = 0;
  for (let period = 0; period + 1 < starts.length; period++) {
    let re = 0;
    let im = 0;
    let own = 0;
    for (let n = starts[period]; n < starts[period + 1]; n++) {
      re += wiped[2 * n] * replica[n];
      im += wiped[2 * n + 1] * replica[n];
      own += replica[n] * replica[n];
    }
    if (own > 0) energy += (re * re + im * im) / own;
  }
  return energy;
}

function interleaved(replica: Float32Array): Float32Array {
  const out = new Float32Array(2 * replica.length);
  for (let n = 0; n < replica.length; n++) out[2 * n] = replica[n];
  return out;
}

/** Complex amplitude of each period, the least-squares one for the given complex shape. */
function periodAmplitudes(wiped: Float32Array, shape: Float32Array, starts: readonly number[]): Float64Array {
  const amplitudes = new Float64Array(2 * (starts.length - 1));
  for (let period = 0; period + 1 < starts.length; period++) {
    let re = 0;
    let im = 0;
    let own = 0;
    for (let at = 2 * starts[period]; at < 2 * starts[period + 1]; at += 2) {
      re += wiped[at] * shape[at] + wiped[at + 1] * shape[at + 1];
      im += wiped[at + 1] * shape[at] - wiped[at] * shape[at + 1];
      own += shape[at] * shape[at] + shape[at + 1] * shape[at + 1];
    }
    if (own > 0) {
      amplitudes[2 * period] = re / own;
      amplitudes[2 * period + 1] = im / own;
    }
  }
  return amplitudes;
}

/** Complex weights of the taps by least squares over all periods, given their amplitudes. */
function fitTaps(
  wiped: Float32Array,
  replica: Float32Array,
  amplitudes: Float64Array,
  starts: readonly number[],
): { re: Float64Array; im: Float64Array } {
  const matrix = Array.from({ length: TAPS }, () => new Float64Array(TAPS));
  const re = new Float64Array(TAPS);
  const im = new Float64Array(TAPS);
  const side = (TAPS - 1) / 2;
  for (let period = 0; period + 1 < starts.length; period++) {
    const a = amplitudes[2 * period];
    const b = amplitudes[2 * period + 1];
    const power = a * a + b * b;
    const first = Math.max(side, starts[period]);
    const last = Math.min(replica.length - side, starts[period + 1]);
    for (let n = first; n < last; n++) {
      const x = wiped[2 * n] * a + wiped[2 * n + 1] * b;
      const y = wiped[2 * n + 1] * a - wiped[2 * n] * b;
      for (let j = 0; j < TAPS; j++) {
        const value = replica[n + j - side];
        re[j] += x * value;
        im[j] += y * value;
        const row = matrix[j];
        for (let k = 0; k <= j; k++) row[k] += power * value * replica[n + k - side];
      }
    }
  }
  return { re: solveSymmetric(matrix, re), im: solveSymmetric(matrix, im) };
}

function filtered(replica: Float32Array, taps: { re: Float64Array; im: Float64Array }): Float32Array {
  const side = (TAPS - 1) / 2;
  const out = new Float32Array(2 * replica.length);
  for (let n = 0; n < replica.length; n++) {
    let re = 0;
    let im = 0;
    for (let j = 0; j < TAPS; j++) {
      const value = replica[Math.min(replica.length - 1, Math.max(0, n + j - side))];
      re += taps.re[j] * value;
      im += taps.im[j] * value;
    }
    out[2 * n] = re;
    out[2 * n + 1] = im;
  }
  return out;
}

function scaled(shape: Float32Array, amplitudes: Float64Array, starts: readonly number[]): Fit {
  const model = new Float32Array(shape.length);
  let energy = 0;
  for (let period = 0; period + 1 < starts.length; period++) {
    const a = amplitudes[2 * period];
    const b = amplitudes[2 * period + 1];
    for (let at = 2 * starts[period]; at < 2 * starts[period + 1]; at += 2) {
      model[at] = a * shape[at] - b * shape[at + 1];
      model[at + 1] = a * shape[at + 1] + b * shape[at];
      energy += model[at] * model[at] + model[at + 1] * model[at + 1];
    }
  }
  return { model, energy };
}
