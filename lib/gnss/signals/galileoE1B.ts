import { FAST_AMPLITUDE, galileoE1, SLOW_AMPLITUDE } from "./galileoE1";
import { E1B_MEMORY_CODES } from "./galileoE1BCodes";
import { levelsOfHex } from "./levelsOfHex";
import { rowOf } from "./rowOf";
import type { Signal } from "./signal";

const TITLE = "Galileo E1-B";

const CODES: ReadonlyMap<number, string> = new Map(E1B_MEMORY_CODES.map((hex, n) => [n + 1, hex]));

/** The data component, coded at rate 1/2. */
export const galileoE1B: Signal = {
  ...galileoE1,
  title: TITLE,
  modulation: {
    kind: "CBOC",
    n: 1,
    parts: [
      { m: 1, amplitude: SLOW_AMPLITUDE },
      { m: 6, amplitude: FAST_AMPLITUDE },
    ],
  },
  data: { bitsPerS: 125, symbolsPerS: 250 },
  secondary: null,
  prns: [...CODES.keys()],
  code: (prn) => levelsOfHex(rowOf(CODES, prn, TITLE), galileoE1.lengthChips),
};
