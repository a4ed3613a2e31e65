import { createFft } from "@/lib/numeric/fft";

/**
 * One period of a real code from the lines of its Fourier series, those beyond `highest` left out: the code behind an
 * ideal low-pass filter, scaled to power 1.
 * @param lines complex C[0] to C[highest], real and imaginary parts alternating; C[-k] is the conjugate of C[k]
 * @param points of the period, a power of two above 2 * highest
 * @returns points + 1 values, the last equal to the first, for linear interpolation
 */
export function codeWave(lines: Float64Array, highest: number, points: number): Float64Array {
  let power = lines[0] * lines[0];
  for (let k = 1; k <= highest; k++) power += 2 * (lines[2 * k] * lines[2 * k] + lines[2 * k + 1] * lines[2 * k + 1]);
  const scale = 1 / Math.sqrt(power);
  // The code is real: the conjugates of twice the positive lines, transformed forwards, have it as their real part.
  const spectrum = new Float64Array(2 * points);
  for (let k = 0; k <= highest; k++) {
    const weight = k === 0 ? scale : 2 * scale;
    spectrum[2 * k] = weight * lines[2 * k];
    spectrum[2 * k + 1] = -weight * lines[2 * k + 1];
  }
  const wave = new Float64Array(2 * points);
  createFft(points).transform(wave, spectrum);
  return Float64Array.from({ length: points + 1 }, (_, n) => wave[2 * (n % points)]);
}
