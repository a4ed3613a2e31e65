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

/** Distance of the carrier from 0 Hz as the samples show it; an intermediate frequency beyond half the rate folds back. */
export const foldedCarrierHz = ({ rateHz, ifHz }: SampledCapture): number =>
  Math.abs(ifHz - rateHz * Math.round(ifHz / rateHz));

/**
 * How far from the carrier the capture can serve in Hz. Complex samples hold half their rate on either side; in real ones the
 * mirrored spectrum begins at 0 Hz and at half the rate. 0 when a real capture has its carrier there.
 */
export function usableHalfWidthHz(capture: SampledCapture): number {
  const folded = foldedCarrierHz(capture);
  return capture.complex ? capture.rateHz / 2 : Math.min(folded, capture.rateHz / 2 - folded);
}
