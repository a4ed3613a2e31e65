import type { Unit } from "@/lib/gnss/units";
import { formatQuantity } from "./formatQuantity";

/** A difference always carries its sign, unless it rounds to nothing. */
export function formatDifference(value: number, unit: Unit, decimals: number): string {
  const text = formatQuantity(value, unit, decimals);
  return value > 0 && /[1-9]/.test(formatQuantity(value, "1", decimals)) ? `+${text}` : text;
}
