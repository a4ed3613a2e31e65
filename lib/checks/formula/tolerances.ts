import { UNITS, type Unit } from "@/lib/gnss/units";
import type { OwnQuantity } from "./parameters";

const LEVELS: readonly Unit[] = ["dB", "dB-Hz", "dBm", "dBW", "dB/100m"];

/** The unit in which a tolerance of this quantity is stated: differences of levels are in dB, whatever they are levels of. */
export const toleranceUnitOf = (unit: Unit): Unit => (["dBm", "dBW", "dB-Hz"].includes(unit) ? "dB" : unit);

/** A share of the right value means nothing for a level. */
export const maybeShare = (unit: Unit): boolean => !LEVELS.includes(unit) && unit !== "%";

export const isShare = ({ unit, tolerance }: Pick<OwnQuantity, "unit" | "tolerance">): boolean =>
  tolerance.unit === "%" && maybeShare(unit);

/** The tolerance at that right value, in the unit of the quantity. */
export function toleranceAt(quantity: Pick<OwnQuantity, "unit" | "tolerance">, right: number): number {
  const { unit, tolerance } = quantity;
  if (isShare(quantity)) return (tolerance.value / 100) * Math.abs(right);
  return (tolerance.value * UNITS[tolerance.unit].toBase) / UNITS[unit].toBase;
}

/** Figures behind the point that a difference of a tenth of the tolerance shows in. */
export function decimalsFor(tolerance: number): number {
  let decimals = 0;
  for (let unit = 1; unit > tolerance / 10 && decimals < 12; unit /= 10) decimals++;
  return decimals;
}
