import { chipsToMetres, chipsToSeconds } from "@/lib/gnss/constants";
import { decibels } from "@/lib/numeric/elementary";
import type { Answers, PublicCase } from "../kind";
import { readTrace } from "./readTrace";

/** The right method, from what the technician sees: highest cell, second peak, noise away from the peak, threshold. */
export function solve({ data }: PublicCase): Answers {
  const reading = readTrace(data.trace as number[], data.falseAlarmPerCell as number);
  const lagChips = reading.highestLagChips;
  return {
    "reading.detection": reading.detected ? "yes" : "no",
    "reading.lag": lagChips.toFixed(2),
    ...convertedLag(lagChips),
    "reading.peakRatio": (2 * decibels(reading.highest / reading.second)).toFixed(1),
    "reading.noiseMean": reading.noiseMean.toFixed(2),
    "reading.threshold": reading.threshold.toFixed(2),
  };
}

/** The two conversions as a careful person writes them. */
export const convertedLag = (lagChips: number): Answers => ({
  "reading.lagTime": (chipsToSeconds(lagChips) * 1e6).toFixed(2),
  "reading.lagLength": chipsToMetres(lagChips).toFixed(0),
});
