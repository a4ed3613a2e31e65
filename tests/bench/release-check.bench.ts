import { readFileSync } from "node:fs";
import path from "node:path";
import { kindOf } from "@/lib/checks/registry";
import { FULL_CASES, WHOLE_CASES } from "@/lib/checks/release-check/rule";
import { tryCase, type TriedKind } from "@/lib/checks/release-check/tryCase";
import { tryWholeCase } from "@/lib/checks/release-check/tryWholeCase";
import { readModule } from "@/lib/mdx/readModule";
import type { TableBench } from "./bench";
import { cpuMs } from "./cpuMs";

const MODULE = "content/modules/sbw-r2.mdx";
const CASES = 30;
const SEED = "5b".repeat(32);

export const bench: TableBench = {
  title: `time to compute the release check of the largest module of the demonstration, from ${CASES} cases of each check and one whole one`,
  async table() {
    const { checks } = await readModule(readFileSync(path.resolve(import.meta.dirname, "../..", MODULE), "utf8"));
    let total = 0;
    const rows = checks.flatMap((plan) => {
      const kind = kindOf(plan.kind, plan.version);
      if (!kind.trial) return [];
      const tried = kind as TriedKind;
      const caseMs = timeOf(CASES, (n) => tryCase(tried, plan, SEED, n));
      const wholeMs = tried.trial.whole ? 0 : timeOf(1, (n) => tryWholeCase(tried, plan, SEED, n));
      const seconds = (caseMs * FULL_CASES + wholeMs * WHOLE_CASES) / 1000;
      total += seconds;
      return [[plan.id, caseMs.toFixed(1), wholeMs ? wholeMs.toFixed(0) : "–", seconds.toFixed(0)]];
    });
    return [
      ["check", "CPU ms a case", "ms a whole case", `s for ${FULL_CASES} and ${WHOLE_CASES} whole`],
      ...rows,
      ["together", "", "", total.toFixed(0)],
    ];
  },
};

function timeOf(count: number, run: (n: number) => unknown): number {
  run(count); // not compiled yet
  const started = cpuMs();
  for (let n = 0; n < count; n++) run(n);
  return (cpuMs() - started) / count;
}
