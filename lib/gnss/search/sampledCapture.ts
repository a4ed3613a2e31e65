/** Samples of a front end as they stand in a recording. */
export type SampledCapture = {
  /** Complex: I and Q alternating; real: one number a sample. Any scale; the mean of each part is zero. */
  samples: Int8Array | Int16Array | Float32Array | Float64Array;
  complex: boolean;
  rateHz: number;
  /** Where the nominal carrier stands in the samples; a signal with Doppler stands above it. */
  ifHz: number;
};

export const sampleCount = ({ samples, complex }: SampledCapture): number =>
  complex ? samples.length / 2 : samples.length;

/**
 * How far from the carrier the capture can serve in Hz. Complex samples hold half their rate on either side; in real ones the
 * mirrored spectrum begins at 0 Hz and at half the rate. 0 when a real capture has its carrier there.
 */
export function usableHalfWidthHz({ complex, rateHz, ifHz }: SampledCapture): number {
  if (complex) return rateHz / 2;
  const folded = Math.abs(ifHz - rateHz * Math.round(ifHz / rateHz));
  return Math.min(folded, rateHz / 2 - folded);
}
