import { FAST_AMPLITUDE, galileoE1, SLOW_AMPLITUDE } from "./galileoE1";
import { E1C_MEMORY_CODES } from "./galileoE1CCodes";
import { levelsOfHex } from "./levelsOfHex";
import { rowOf } from "./rowOf";
import type { Signal } from "./signal";

const TITLE = "Galileo E1-C";
const CS25 = "380AD90"; // Galileo OS SIS ICD, issue 2, 3.5: 25 chips of 4 ms, the last three bits fill up

const CODES: ReadonlyMap<number, string> = new Map(E1C_MEMORY_CODES.map((hex, n) => [n + 1, hex]));

/** The pilot; its fast subcarrier has the opposite sign. */
export const galileoE1C: Signal = {
  ...galileoE1,
  title: TITLE,
  modulation: {
    kind: "CBOC",
    n: 1,
    parts: [
      { m: 1, amplitude: SLOW_AMPLITUDE },
      { m: 6, amplitude: -FAST_AMPLITUDE },
    ],
  },
  data: null,
  secondary: { lengthChips: 25, levels: () => levelsOfHex(CS25, 25) },
  prns: [...CODES.keys()],
  code: (prn) => levelsOfHex(rowOf(CODES, prn, TITLE), galileoE1.lengthChips),
};
