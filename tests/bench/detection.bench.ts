import { writeFileSync } from "node:fs";
import path from "node:path";
import { planDetection, type SearchPlan } from "@/lib/gnss/searchPlan";
import { seededRandom } from "@/lib/numeric/random";
import type { Bench } from "./bench";

const DRAWS = 5000;
const UNIFORMS_PER_DRAW = 4; // code, Doppler, bit edge, bit: 20 ms hold one edge

const PLAN = {
  cn0DbHz: 35,
  coherentMs: 1,
  sums: 20,
  dopplerBinHz: 500,
  codeStepChips: 0.5,
  windowHz: 5000,
  correlators: 1,
  bitEdgesKnown: false,
  draws: DRAWS,
  falseAlarmPerSearch: 1e-3,
} as const;

export const bench: Bench = {
  title: "detection probability of a plan: 5,000 draws, 20 sums of 1 ms",
  async prepare(folder) {
    const random = seededRandom("d7".repeat(32), "plan");
    const uniforms = Float64Array.from({ length: UNIFORMS_PER_DRAW * DRAWS }, () => random.uniform());
    writeFileSync(path.join(folder, "draws.f64"), uniforms);
    writeFileSync(path.join(folder, "inputs.json"), JSON.stringify(PLAN));
    const plan = (): SearchPlan => {
      let next = 0;
      return { ...PLAN, random: { ...random, uniform: () => uniforms[next++] } };
    };
    return {
      contenders: [{ name: "ours", target: 1, run: () => planDetection(plan()) }],
      differences: ([ours], reference) => {
        const off = Math.abs((ours as number) - (reference as number));
        return off <= 1e-6 ? [] : [`detection ${ours}, the reference ${reference}`];
      },
    };
  },
};
