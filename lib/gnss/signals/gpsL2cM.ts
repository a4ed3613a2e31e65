import { gpsL2c, gpsL2cCode } from "./gpsL2cCode";
import { rowOf } from "./rowOf";
import type { Signal } from "./signal";

const TITLE = "GPS L2 CM";
const LENGTH_CHIPS = 10_230; // 20 ms; IS-GPS-200, 3.3.2.4

/** Initial content of the register by PRN. IS-GPS-200, Tables 3-IIa and 3-IIb. */
// prettier-ignore
const STARTS: ReadonlyMap<number, number> = new Map([
  [1, 0o742417664], [2, 0o756014035], [3, 0o002747144], [4, 0o066265724], [5, 0o601403471], [6, 0o703232733],
  [7, 0o124510070], [8, 0o617316361], [9, 0o047541621], [10, 0o733031046], [11, 0o713512145], [12, 0o024437606],
  [13, 0o021264003], [14, 0o230655351], [15, 0o001314400], [16, 0o222021506], [17, 0o540264026], [18, 0o205521705],
  [19, 0o064022144], [20, 0o120161274], [21, 0o044023533], [22, 0o724744327], [23, 0o045743577], [24, 0o741201660],
  [25, 0o700274134], [26, 0o010247261], [27, 0o713433445], [28, 0o737324162], [29, 0o311627434], [30, 0o710452007],
  [31, 0o722462133], [32, 0o050172213], [33, 0o500653703], [34, 0o755077436], [35, 0o136717361], [36, 0o756675453],
  [37, 0o435506112], [38, 0o771353753], [39, 0o226107701], [40, 0o022025110], [41, 0o402466344], [42, 0o752566114],
  [43, 0o702011164], [44, 0o041216771], [45, 0o047457275], [46, 0o266333164], [47, 0o713167356], [48, 0o060546335],
  [49, 0o355173035], [50, 0o617201036], [51, 0o157465571], [52, 0o767360553], [53, 0o023127030], [54, 0o431343777],
  [55, 0o747317317], [56, 0o045706125], [57, 0o002744276], [58, 0o060036467], [59, 0o217744147], [60, 0o603340174],
  [61, 0o326616775], [62, 0o063240065], [63, 0o111460621],
]);

/** The moderate code of L2C; its data are coded at rate 1/2. */
export const gpsL2cM: Signal = {
  ...gpsL2c,
  title: TITLE,
  lengthChips: LENGTH_CHIPS,
  modulation: { kind: "BPSK-R in turns", n: 1, place: 0, places: 2 },
  data: { bitsPerS: 25, symbolsPerS: 50 },
  source: "IS-GPS-200, 3.3.2.4, Tables 3-IIa and 3-IIb",
  prns: [...STARTS.keys()],
  code: (prn) => gpsL2cCode(rowOf(STARTS, prn, TITLE), LENGTH_CHIPS),
};
