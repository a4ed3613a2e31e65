import type { Modulation, Signal } from "../signals/signal";
import { chipsOf, type Chips } from "../shiftRegister";

/** A signal as a search needs it: all that differs from one signal to the next is data. */
export type SearchSignal = {
  carrierHz: number;
  chipRateHz: number;
  lengthChips: number;
  /** Parts of alternating sign that the subcarrier cuts a chip into: 1 for plain chips, 2 for BOC(1,1). */
  halvesPerChip: number;
  /** Time after which a data symbol or a chip of a secondary code may change the sign; Infinity for never. */
  symbolS: number;
  /** One period, +1 or -1 each. @throws RangeError for a number without a code */
  chips(prn: number): Chips;
};

/**
 * What the search takes from a signal's definition. Of a multiplexed subcarrier only the slow part is searched: the share of
 * the fast one, 1/11 of the power at most, lies beyond the band of a search.
 */
export function searchSignalOf(signal: Signal): SearchSignal {
  const { carrierHz, chipRateHz, lengthChips, modulation, data, secondary } = signal;
  const symbolS = secondary ? lengthChips / chipRateHz : data ? 1 / data.symbolsPerS : Infinity;
  const chips = (prn: number) => chipsOf(signal.code(prn));
  return { carrierHz, chipRateHz, lengthChips, halvesPerChip: halvesOf(modulation), symbolS, chips };
}

function halvesOf(modulation: Modulation): number {
  switch (modulation.kind) {
    case "BPSK-R":
      return 1;
    case "BPSK-R in turns":
      throw new RangeError("searchSignalOf: a code whose chips take turns with another's is not searched yet");
    case "BOC":
    case "TMBOC":
      return (2 * modulation.m) / modulation.n;
    case "CBOC":
      return (2 * Math.min(...modulation.parts.map(({ m }) => m))) / modulation.n;
  }
}

/** Distance of a code's spectral lines in Hz; also how often it repeats in a second. */
export const lineSpacingHz = ({ chipRateHz, lengthChips }: SearchSignal): number => chipRateHz / lengthChips;

/** Change of the code's rate in chips per second that goes with a carrier's Doppler. */
export const codeDriftChipsPerS = ({ chipRateHz, carrierHz }: SearchSignal, dopplerHz: number): number =>
  (dopplerHz * chipRateHz) / carrierHz;
