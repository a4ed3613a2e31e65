import { registerRun, registerSequence, type Levels } from "../shiftRegister";

const XA = 0o33001; // 1 + x^9 + x^10 + x^12 + x^13, IS-GPS-705, 3.2.1.1
const XB = 0o30733; // 1 + x + x^3 + x^4 + x^6 + x^7 + x^8 + x^12 + x^13, same section
const XA_CHIPS = 8190; // XA starts afresh one chip before its own end
const LENGTH_CHIPS = 10_230;

/** What the two components of L5 have in common. */
export const gpsL5 = {
  carrierHz: 1176.45e6, // IS-GPS-705
  chipRateHz: 10.23e6,
  lengthChips: LENGTH_CHIPS,
  modulation: { kind: "BPSK-R", n: 10 },
  source: "IS-GPS-705, 3.2.1.1, Tables 3-Ia and 3-Ib; QZSS: IS-QZSS-PNT, Table 3.2.5-1",
} as const;

/** XA, shortened to 8190 chips, plus XB read `advance` chips later; both start afresh each millisecond. */
export function gpsL5Code(advance: number): Levels {
  const xa = registerRun(XA, 0o17777, XA_CHIPS);
  const xb = registerSequence(XB);
  return Uint8Array.from({ length: LENGTH_CHIPS }, (_, n) => xa[n % XA_CHIPS] ^ xb[(n + advance) % xb.length]);
}
