import type { Signal } from "../signals/signal";
import { boc, bpsk, type Modulation } from "./modulation";

/**
 * Spectrum of a signal of the registry. A composite subcarrier is taken as the sum of its parts' powers: the product of
 * the two subcarriers, of opposite sign in data and pilot, falls out of their sum and is left out here. A code that
 * takes turns with another has the spectrum of its chips.
 */
export function modulationOfSignal({ modulation }: Pick<Signal, "modulation">): Modulation {
  switch (modulation.kind) {
    case "BPSK-R":
    case "BPSK-R in turns":
      return bpsk(modulation.n);
    case "BOC":
      return boc(modulation.m, modulation.n);
    case "CBOC":
      return sumOf(modulation.parts.map(({ m, amplitude }) => ({ share: amplitude * amplitude, m, n: modulation.n })));
    case "TMBOC": {
      const { m, fastM, n, fastPlaces, periodChips } = modulation;
      const fast = fastPlaces.length / periodChips;
      return sumOf([
        { share: 1 - fast, m, n },
        { share: fast, m: fastM, n },
      ]);
    }
  }
}

function sumOf(parts: readonly { share: number; m: number; n: number }[]): Modulation {
  const list = parts.map(({ share, m, n }) => ({ share, modulation: boc(m, n) }));
  return { kind: "sum", chipRateHz: list[0].modulation.chipRateHz, parts: list };
}
