import type { Levels } from "../shiftRegister";

/**
 * How chips become a waveform. `BPSK-R(n)`: rectangular chips. `BOC(m,n)`: each chip times a square-wave subcarrier of
 * m x 1.023 MHz in sine phase. `CBOC`: a weighted sum of two of those. `TMBOC`: one chip in so many carries the faster of
 * two subcarriers. n x 1.023 MHz is always the rate of the chips sent.
 */
export type Modulation =
  | { kind: "BPSK-R"; n: number }
  /** Chips of this code take the given place (from 0) among so many; the others belong to another code. */
  | { kind: "BPSK-R in turns"; n: number; place: number; places: number }
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

/** The published codes of one kind. */
export type CodeTable = {
  /** Constellation, band and component, for people. */
  title: string;
  lengthChips: number;
  /** Document and table of the codes. */
  source: string;
  /** All satellites with a published code, ascending. */
  prns: readonly number[];
  /**
   * One period as logic levels, first chip first. The array is the caller's own.
   * @throws RangeError when there is no published code for this number
   */
  code(prn: number): Levels;
};

/** One component of a satellite navigation signal; its table holds the primary codes. */
export type Signal = CodeTable & {
  carrierHz: number;
  /** Of this component's own code. */
  chipRateHz: number;
  modulation: Modulation;
  /**
   * What the component carries; null for a pilot. Symbols differ from bits where the message is coded at rate 1/2. Bit
   * rates but those of L1 C/A and I5 are from memory.
   */
  data: { bitsPerS: number; symbolsPerS: number } | null;
  secondary: SecondaryCode | null;
};
