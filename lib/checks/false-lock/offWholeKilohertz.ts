import { circularDifference } from "../circularDifference";

const LINE_SPACING_HZ = 1000; // C/A codes repeat each millisecond, so their lines are 1 kHz apart

/** How far one Doppler is from another plus or minus whole kHz, in Hz from 0 to 500. */
export const offWholeKilohertz = (aHz: number, bHz: number): number =>
  Math.abs(circularDifference(aHz, bHz, LINE_SPACING_HZ));
