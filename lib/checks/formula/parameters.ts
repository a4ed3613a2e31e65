import type { Unit } from "@/lib/gnss/units";
import type { ToleranceValue } from "../kind";

/** A number that is drawn for each case: `from` and every `step` up to `to`, both ends included, in `unit`. */
export type Given = { id: string; label: string; unit: Unit; from: number; to: number; step: number };

/** What is asked; `answer` is the formula of the right value. A tolerance in % of another unit is a share of that value. */
export type OwnQuantity = {
  id: string;
  label: string;
  unit: Unit;
  answer: string;
  tolerance: ToleranceValue;
  critical: boolean;
};

/** A known wrong way to the quantity `of`, named on the marking record of whoever went it. */
export type Wrong = { id: string; label: string; of: string; answer: string };

/** All of it the lead's own words; a release stores it as the parameters of the check. */
export type FormulaParameters = {
  givens: readonly Given[];
  quantities: readonly OwnQuantity[];
  wrongs: readonly Wrong[];
};

/** Bounds of one check. */
export const MOST_GIVENS = 12;
export const MOST_QUANTITIES = 12;
export const MOST_WRONGS = 24;
export const MOST_STEPS = 100_000;
export const MOST_DECIMALS = 9;
