import type { InterfererFigures } from "./drawScene";

/** Of a centre: 10 kHz, or 2 % of offset or width, whichever is most; nobody sees the middle of 2 MHz of noise to 10 kHz. */
export const centreToleranceHz = (
  { centreHz, bandwidthHz }: Pick<InterfererFigures, "centreHz" | "bandwidthHz">,
  leastHz = 10_000,
): number => Math.max(leastHz, 0.02 * Math.abs(centreHz), 0.02 * bandwidthHz);

/** A single carrier has no width but that of the resolution it is looked at with. */
export const LINE_WIDTH_HZ = 10_000;
