import { CA_G2_STAGES, caCode } from "../caCode";
import { CA_G2_DELAYS } from "../caDelays";
import { CA_CHIP_RATE_HZ, CA_LENGTH_CHIPS, L1_HZ } from "../constants";
import { levelsOf } from "../shiftRegister";
import type { Signal } from "./signal";

/**
 * The C/A code of GPS, SBAS (PRN 120 to 158) and QZSS (183 to 206). The data rate given is that of GPS; SBAS sends
 * 250 bit/s as 500 symbols/s (RTCA DO-229).
 */
export const gpsL1Ca: Signal = {
  title: "GPS L1 C/A",
  carrierHz: L1_HZ,
  chipRateHz: CA_CHIP_RATE_HZ,
  lengthChips: CA_LENGTH_CHIPS,
  modulation: { kind: "BPSK-R", n: 1 },
  data: { bitsPerS: 50, symbolsPerS: 50 },
  secondary: null,
  source: "IS-GPS-200, 3.3.2.3, Tables 3-Ia, 3-Ib and 6-I",
  prns: [...CA_G2_STAGES.keys(), ...CA_G2_DELAYS.keys()],
  code: (prn) => levelsOf(caCode(prn)),
};
