import { integrate } from "@/lib/numeric/quadrature";
import type { Modulation } from "./modulation";

const PANELS_PER_LOBE = 2;

/**
 * Integral over a band centred on the carrier, from -B/2 to B/2, of an even function of frequency made of the densities
 * of some modulations. Panels of half a lobe of the slowest chips: relative error below 1e-10.
 * @param modulations those whose densities the function holds; they set the width of the lobes
 */
export function integrateBand(
  of: (offsetHz: number) => number,
  bandwidthHz: number,
  modulations: readonly Modulation[],
): number {
  if (!(bandwidthHz > 0 && bandwidthHz < Infinity))
    throw new RangeError(`integrateBand: bandwidth above 0 Hz, got ${bandwidthHz}`);
  const lobeHz = Math.min(...modulations.map((modulation) => modulation.chipRateHz));
  const panels = Math.max(1, Math.ceil((PANELS_PER_LOBE * bandwidthHz) / 2 / lobeHz));
  return 2 * integrate(of, 0, bandwidthHz / 2, panels);
}
