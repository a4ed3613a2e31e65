import type { Calculator } from "./calculator";
import { CABLE_ECHO } from "./cableEcho";
import { SEARCH_PLAN } from "./searchPlan";
import { TWO_CODES } from "./twoCodes";

/** The bench, by number. A calculator's body stands in `components/calculators/bodies.tsx` under the same tag. */
export const CALCULATORS = [TWO_CODES, SEARCH_PLAN, CABLE_ECHO] as const satisfies readonly Calculator[];

export type BenchCalculator = (typeof CALCULATORS)[number];
export type CalculatorTag = BenchCalculator["tag"];

export const calculatorTagged = (tag: CalculatorTag): Calculator => CALCULATORS.find((one) => one.tag === tag)!;
