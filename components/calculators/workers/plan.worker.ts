import { planPerformance, type PlanPerformance } from "@/lib/gnss/searchPlan";
import { seededRandom } from "@/lib/numeric/random";
import "./tellFiles";

export type PlanInputs = {
  cn0DbHz: number;
  coherentMs: number;
  sums: number;
  dopplerBinHz: number;
  codeStepChips: number;
  windowHz: number;
  falseAlarmPerSearch: number;
  correlators: number;
};
export type PlanAnswer = {
  run: number;
  inputs: PlanInputs;
  performance: PlanPerformance;
  curve: { cn0DbHz: number; detection: number }[];
};

const DRAWS = 3000;
const CURVE_DRAWS = 400;
export const CURVE_FROM_DB_HZ = 20;
export const CURVE_TO_DB_HZ = 50;
/** The same draws every time: the curve must not tremble while an input is changed. */
const SEED = "5".repeat(64);

addEventListener("message", ({ data }: MessageEvent<{ run: number; inputs: PlanInputs }>) => {
  const { run, inputs } = data;
  const performance = attained(inputs, DRAWS);
  const curve = Array.from({ length: CURVE_TO_DB_HZ - CURVE_FROM_DB_HZ + 1 }, (_, step) => {
    const cn0DbHz = CURVE_FROM_DB_HZ + step;
    return { cn0DbHz, detection: attained({ ...inputs, cn0DbHz }, CURVE_DRAWS).detection };
  });
  postMessage({ run, inputs, performance, curve } satisfies PlanAnswer);
});

const attained = (inputs: PlanInputs, draws: number) =>
  planPerformance({ ...inputs, bitEdgesKnown: false, draws, random: seededRandom(SEED, "plan") });
