import type { SceneSatellite } from "@/lib/gnss/scene";

/** A sky as a bench sees it: eight satellites from 40 to 47 dB-Hz, Dopplers over +-5 kHz, data bits. */
export const eightSatellites = (): SceneSatellite[] =>
  [2, 5, 9, 14, 17, 21, 26, 30].map((prn, n) => ({
    prn,
    codePhaseChips: (prn * 97.37) % 1023,
    dopplerHz: -4500 + n * 1213.3,
    cn0DbHz: 40 + n,
    carrierPhaseCycles: n / 10,
    dataBits: Int8Array.from([1, -1, 1, 1, -1]),
    bitEdgeMs: n,
  }));
