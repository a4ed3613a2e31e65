import type { Calculator } from "./calculator";
import { CABLE_ECHO } from "./cableEcho";
import { CAPTURE_VIEW } from "./captureView";
import { CHAIN_LEVELS } from "./chainLevels";
import { DELAY_BUDGET } from "./delayBudget";
import { FALSE_LOCK } from "./falseLock";
import { LOOP_JITTER } from "./loopJitter";
import { PULSE_ERROR } from "./pulseError";
import { SEARCH_PLAN } from "./searchPlan";
import { TWO_CODES } from "./twoCodes";

/** The bench, by number. A calculator's body stands in `components/calculators/bodies.tsx` under the same tag. */
export const CALCULATORS = [
  TWO_CODES,
  FALSE_LOCK,
  SEARCH_PLAN,
  CAPTURE_VIEW,
  LOOP_JITTER,
  CHAIN_LEVELS,
  CABLE_ECHO,
  DELAY_BUDGET,
  PULSE_ERROR,
] as const satisfies readonly Calculator[];

export type BenchCalculator = (typeof CALCULATORS)[number];
export type CalculatorTag = BenchCalculator["tag"];

export const calculatorTagged = (tag: CalculatorTag): Calculator => CALCULATORS.find((one) => one.tag === tag)!;
