import { E5A_HZ, galileoE5, galileoE5Code } from "./galileoE5Code";
import { levelsOfHex } from "./levelsOfHex";
import { rowOf } from "./rowOf";
import type { Signal } from "./signal";

const TITLE = "Galileo E5a-I";
const POLYNOMIALS = [0o40503, 0o50661] as const; // Galileo OS SIS ICD, issue 2, 3.4.1, Table 16
const CS20 = "842E9"; // second code, hexadecimal; same document, 3.5

/** Initial content of the second register by satellite. Same section, Table 17. */
// prettier-ignore
const STARTS: ReadonlyMap<number, number> = new Map([
  [1, 0o30305], [2, 0o14234], [3, 0o27213], [4, 0o20577], [5, 0o23312], [6, 0o33463], [7, 0o15614], [8, 0o12537],
  [9, 0o01527], [10, 0o30236], [11, 0o27344], [12, 0o07272], [13, 0o36377], [14, 0o17046], [15, 0o06434], [16, 0o15405],
  [17, 0o24252], [18, 0o11631], [19, 0o24776], [20, 0o00630], [21, 0o11560], [22, 0o17272], [23, 0o27445],
  [24, 0o31702], [25, 0o13012], [26, 0o14401], [27, 0o34727], [28, 0o22627], [29, 0o30623], [30, 0o27256],
  [31, 0o01520], [32, 0o14211], [33, 0o31465], [34, 0o22164], [35, 0o33516], [36, 0o02737], [37, 0o21316],
  [38, 0o35425], [39, 0o35633], [40, 0o24655], [41, 0o14054], [42, 0o27027], [43, 0o06604], [44, 0o31455],
  [45, 0o34465], [46, 0o25273], [47, 0o20763], [48, 0o31721], [49, 0o17312], [50, 0o13277],
]);

/** Data of E5a; coded at rate 1/2. */
export const galileoE5aI: Signal = {
  ...galileoE5,
  title: TITLE,
  carrierHz: E5A_HZ,
  data: { bitsPerS: 25, symbolsPerS: 50 },
  secondary: { lengthChips: 20, levels: () => levelsOfHex(CS20, 20) },
  source: "Galileo OS SIS ICD, issue 2, 3.4.1, Tables 16 and 17",
  prns: [...STARTS.keys()],
  code: (prn) => galileoE5Code(POLYNOMIALS, rowOf(STARTS, prn, TITLE)),
};
