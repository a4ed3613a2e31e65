import type { SearchSettings } from "@/lib/gnss/acquire";

/**
 * 4 ms x 20 uses 80 of the 100 ms; half-bin loss 0.9 dB. One false alarm in a million searches, because the codes of 43
 * dB-Hz satellites raise peaks of 22 dB-Hz in the grids of all others (see `acquire`); 36 dB-Hz is still always found.
 */
export const REFERENCE_SEARCH: Omit<SearchSettings, "dopplerHalfWidthHz"> = {
  coherentMs: 4,
  sums: 20,
  dopplerStepHz: 125,
  falseAlarmPerSearch: 1e-6,
};
