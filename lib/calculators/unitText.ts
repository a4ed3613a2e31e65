import { formatUnit } from "@/lib/checks/formatQuantity";
import type { Unit } from "@/lib/gnss/units";

/** Unit as printed beside a figure; undefined for a plain number. */
export const unitText = (unit: Unit): string | undefined => formatUnit(unit) || undefined;
