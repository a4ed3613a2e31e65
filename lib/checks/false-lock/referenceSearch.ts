import type { SearchSettings } from "@/lib/gnss/acquire";

/** The search that the case asks for and the server runs: the whole of 100 ms, bins of half of one over 10 ms. */
export const REFERENCE_SEARCH: SearchSettings = {
  coherentMs: 10,
  sums: 10,
  dopplerHalfWidthHz: 6000,
  dopplerStepHz: 50,
  falseAlarmPerSearch: 1e-3,
};

/** One over the coherent time: nearer than this two signals share a bin. */
export const RESOLUTION_HZ = 1000 / REFERENCE_SEARCH.coherentMs;
