import type { ComponentType } from "react";
import type { BenchCalculator, CalculatorTag } from "@/lib/calculators/calculators";
import type { CalculatorProps } from "./calculatorProps";
import { CableEcho } from "./CableEcho";
import { CaptureView } from "./CaptureView";
import { ChainLevels } from "./ChainLevels";
import { DelayBudget } from "./DelayBudget";
import { FalseLock } from "./FalseLock";
import { LoopJitter } from "./LoopJitter";
import { PulseError } from "./PulseError";
import { SearchPlan } from "./SearchPlan";
import { TwoCodes } from "./TwoCodes";

/** What each calculator of the bench shows and computes. */
export const BODIES: { [T in CalculatorTag]: ComponentType<CalculatorProps<Extract<BenchCalculator, { tag: T }>>> } = {
  TwoCodes,
  FalseLock,
  SearchPlan,
  CaptureView,
  LoopJitter,
  ChainLevels,
  CableEcho,
  DelayBudget,
  PulseError,
};
