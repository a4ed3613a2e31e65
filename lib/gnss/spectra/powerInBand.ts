import { integrateBand } from "./integrateBand";
import type { Modulation } from "./modulation";
import { powerSpectralDensity } from "./powerSpectralDensity";

/** Share of a signal's power inside a band centred on its carrier, 0 to 1. Integral of its density; definition. */
export const powerInBand = (modulation: Modulation, bandwidthHz: number): number =>
  integrateBand((offsetHz) => powerSpectralDensity(modulation, offsetHz), bandwidthHz, [modulation]);
