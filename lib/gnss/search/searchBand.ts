import { lineSpacingHz, type SearchSignal } from "./searchSignal";
import { foldedCarrierHz, usableHalfWidthHz, type SampledCapture } from "./sampledCapture";

/** Which lines of a code a search uses, and over how many code phases it looks. */
export type SearchBand = {
  /** Lines from -highest to highest. */
  highest: number;
  /** Code phases in one period, a power of two. */
  lags: number;
  /** Whether the capture's spectrum is folded onto itself there. */
  mirrored: boolean;
};

const EDGE = 0.995; // of the usable half width: Doppler must move no line out of the band

/**
 * The main lobe of a signal's spectrum, or as much of it as the capture holds: the lines up to the chip rate, 0.903 of the
 * power of plain chips; twice as far with a subcarrier at the chip rate, which puts the power at either side. Two code phases
 * per chip then carry all that is in it (four with a subcarrier).
 * Real samples with the carrier near 0 Hz hold the lobe folded onto its mirror image. They are searched all the same, but
 * Dopplers of either sign look alike, and the two parts of a correlation's noise are no longer independent.
 * @throws RangeError when the capture holds less than a third of the main lobe
 */
export function searchBand(capture: SampledCapture, signal: SearchSignal): SearchBand {
  const wanted = signal.lengthChips * signal.halvesPerChip;
  const heldWithin = (halfWidthHz: number) => Math.floor((EDGE * halfWidthHz) / lineSpacingHz(signal));
  const mirrored = heldWithin(usableHalfWidthHz(capture)) < wanted / 3 && foldedCarrierHz(capture) < capture.rateHz / 8;
  const usableHz = mirrored ? capture.rateHz / 2 - foldedCarrierHz(capture) : usableHalfWidthHz(capture);
  const held = heldWithin(usableHz);
  const lobeHz = wanted * lineSpacingHz(signal);
  if (held < wanted / 3)
    throw new RangeError(`searchBand: a main lobe of +-${lobeHz} Hz, but +-${usableHz} Hz in the capture around it`);
  let lags = 16;
  while (lags < 2 * wanted) lags *= 2;
  return { highest: Math.min(held, wanted, lags / 2 - 1), lags, mirrored };
}
