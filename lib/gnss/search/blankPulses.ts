import type { SampledCapture } from "./sampledCapture";

/** A stretch of samples as the search may change them. */
export type MutableCapture = Omit<SampledCapture, "samples"> & { samples: Float32Array };

const SEGMENT_S = 20e-6;
const ABOVE_MEDIAN = 4; // power of 40 samples of noise scatters by 16 %; this is far outside
const MOST_SHARE = 0.4; // beyond it the pulses are the rule, and blanking would leave too little

/**
 * Sets segments of 20 us to zero whose power stands 6 dB above the median: pulses of radars and ranging systems.
 * @returns share of the time that was blanked; 0 when nothing stood out or nearly everything did
 */
export function blankPulses({ samples, complex, rateHz }: MutableCapture): number {
  const length = (complex ? 2 : 1) * Math.max(8, Math.round(SEGMENT_S * rateHz));
  const segments = Math.floor(samples.length / length);
  if (segments < 16) return 0;
  const powers = Float64Array.from({ length: segments }, (_, n) => {
    let power = 0;
    for (let at = n * length; at < (n + 1) * length; at++) power += samples[at] * samples[at];
    return power;
  });
  const limit = ABOVE_MEDIAN * Float64Array.from(powers).sort()[segments >> 1];
  const loud = powers.reduce((count, power) => count + (power > limit ? 1 : 0), 0);
  if (loud === 0 || loud > MOST_SHARE * segments) return 0;
  powers.forEach((power, n) => {
    if (power > limit) samples.fill(0, n * length, (n + 1) * length);
  });
  return loud / segments;
}
