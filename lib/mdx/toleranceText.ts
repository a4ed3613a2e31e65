import { formatUnit } from "@/lib/checks/formatQuantity";
import type { ToleranceValue } from "@/lib/checks/kind";

/** A tolerance as a lead writes it: `0.5 chip`, a plain number without a unit. */
export const toleranceText = ({ value, unit }: ToleranceValue): string => `${value} ${formatUnit(unit)}`.trim();
