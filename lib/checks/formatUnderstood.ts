import type { Unit } from "@/lib/gnss/units";
import { formatQuantity, formatUnit } from "./formatQuantity";

/** What the server read from a typed text, in the quantity's own unit and with the figures that were typed. */
export function formatUnderstood(value: number, unit: Unit): string {
  if (value !== 0 && Math.abs(value) < 1e-4) return formatSmall(value, unit);
  let decimals = 0;
  while (decimals < MOST_DECIMALS && Number(value.toFixed(decimals)) !== value) decimals++;
  return formatQuantity(value, unit, decimals);
}

const MOST_DECIMALS = 6;

/** False-alarm probabilities of one cell and the like: 2.3e−8, which parseQuantity reads back. */
function formatSmall(value: number, unit: Unit): string {
  const [figures, exponent] = value.toExponential(2).split("e");
  const text = `${Number(figures)}e${exponent}`.replace(/-/g, "\u2212");
  return unit === "1" ? text : `${text}\u00a0${formatUnit(unit)}`;
}
