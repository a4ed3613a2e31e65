import type { Levels } from "../shiftRegister";

/**
 * How chips become a waveform. `BPSK-R(n)`: rectangular chips. `BOC(m,n)`: each chip times a square-wave subcarrier of
 * m x 1.023 MHz in sine phase. `CBOC`: a weighted sum of two of those. `TMBOC`: one chip in so many carries the faster of
 * two subcarriers. n x 1.023 MHz is always the chip rate.
 */
export type Modulation =
  | { kind: "BPSK-R"; n: number }
  | { kind: "BOC"; m: number; n: number }
  /** Amplitudes of the subcarriers; the squares add up to 1. */
  | { kind: "CBOC"; n: number; parts: readonly { m: number; amplitude: number }[] }
  /** Within each `periodChips` the chips of the listed places (from 0) carry `fastM`, the others `m`. */
  | { kind: "TMBOC"; n: number; m: number; fastM: number; periodChips: number; fastPlaces: readonly number[] };

/** A second, slow code: each of its chips lasts one period of the primary code and is added to it (modulo 2). */
export type SecondaryCode = {
  lengthChips: number;
  /** Logic levels, one period. */
  levels(prn: number): Levels;
};

/** One component of a satellite navigation signal with the published table of its codes. */
export type Signal = {
  /** Constellation, band and component, for people. */
  title: string;
  carrierHz: number;
  /** Of this component's own code; time-multiplexed components take turns. */
  chipRateHz: number;
  lengthChips: number;
  modulation: Modulation;
  /** What the component carries; null for a pilot. Symbols differ from bits where the message is coded. */
  data: { bitsPerS: number; symbolsPerS: number } | null;
  secondary: SecondaryCode | null;
  /** Document and table of the codes. */
  source: string;
  /** All satellites with a published code, ascending. */
  prns: readonly number[];
  /**
   * One period of the primary code as logic levels, first chip first. The array is the caller's own.
   * @throws RangeError when there is no published code for this number
   */
  code(prn: number): Levels;
};
