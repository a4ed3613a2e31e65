/** One satellite's signal as it stands in a capture. */
export type SceneSatellite = {
  prn: number;
  /** Place in the code at the first sample, 0 <= phase < 1023; it grows with time. */
  codePhaseChips: number;
  /** Carrier frequency minus the nominal one; the code runs faster by a 1540th of it. */
  dopplerHz: number;
  /** Power of the signal inside the capture's band to noise density. */
  cn0DbHz: number;
  /** Carrier phase at the first sample. */
  carrierPhaseCycles: number;
  /** +1 or -1 each, 20 code periods long; used again from the start when they run out; null for none. */
  dataBits: Int8Array | null;
  /** Code periods from the one in progress at the first sample to the first bit edge, 0 to 19. */
  bitEdgeMs: number;
};

/** What a capture holds: complex samples at zero intermediate frequency. */
export type Scene = {
  /** Samples per second, a whole number of thousands, so that a code period holds a whole number of samples. */
  rateHz: number;
  durationMs: number;
  ifHz: 0;
  satellites: readonly SceneSatellite[];
};
