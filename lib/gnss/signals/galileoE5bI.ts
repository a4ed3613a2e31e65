import { E5B_HZ, galileoE5, galileoE5Code } from "./galileoE5Code";
import { levelsOfHex } from "./levelsOfHex";
import { rowOf } from "./rowOf";
import type { Signal } from "./signal";

const TITLE = "Galileo E5b-I";
const POLYNOMIALS = [0o64021, 0o51445] as const; // Galileo OS SIS ICD, issue 2, 3.4.1, Table 16
const CS4 = "E"; // second code, hexadecimal; same document, 3.5

/** Initial content of the second register by satellite. Same section, Table 19. */
// prettier-ignore
const STARTS: ReadonlyMap<number, number> = new Map([
  [1, 0o07220], [2, 0o26047], [3, 0o00252], [4, 0o17166], [5, 0o14161], [6, 0o02540], [7, 0o01537], [8, 0o26023],
  [9, 0o01725], [10, 0o20637], [11, 0o02364], [12, 0o27731], [13, 0o30640], [14, 0o34174], [15, 0o06464], [16, 0o07676],
  [17, 0o32231], [18, 0o10353], [19, 0o00755], [20, 0o26077], [21, 0o11644], [22, 0o11537], [23, 0o35115],
  [24, 0o20452], [25, 0o34645], [26, 0o25664], [27, 0o21403], [28, 0o32253], [29, 0o02337], [30, 0o30777],
  [31, 0o27122], [32, 0o22377], [33, 0o36175], [34, 0o33075], [35, 0o33151], [36, 0o13134], [37, 0o07433],
  [38, 0o10216], [39, 0o35466], [40, 0o02533], [41, 0o05351], [42, 0o30121], [43, 0o14010], [44, 0o32576],
  [45, 0o30326], [46, 0o37433], [47, 0o26022], [48, 0o35770], [49, 0o06670], [50, 0o12017],
]);

/** Data of E5b; coded at rate 1/2. */
export const galileoE5bI: Signal = {
  ...galileoE5,
  title: TITLE,
  carrierHz: E5B_HZ,
  data: { bitsPerS: 125, symbolsPerS: 250 },
  secondary: { lengthChips: 4, levels: () => levelsOfHex(CS4, 4) },
  source: "Galileo OS SIS ICD, issue 2, 3.4.1, Tables 16 and 19",
  prns: [...STARTS.keys()],
  code: (prn) => galileoE5Code(POLYNOMIALS, rowOf(STARTS, prn, TITLE)),
};
