import { kindOf } from "@/lib/checks/registry";
import { quantile } from "@/lib/numeric/quantile";
import { planOf, seeds } from "../checks/planOf";
import { cpuMs } from "./cpuMs";

export type KindTimes = { build: [p50: number, p95: number]; mark: [p50: number, p95: number] };

/** CPU time of drawing a case and of marking the right hand-in for it, ms, over so many seeds. */
export function kindTimes(id: string, cases: number): KindTimes {
  const kind = kindOf(id);
  const plan = planOf(kind);
  const [build, mark]: [number[], number[]] = [[], []];
  for (const [n, seed] of seeds(cases + 1).entries()) {
    const begun = cpuMs();
    const built = kind.build(seed, plan);
    const drawn = cpuMs();
    const answers = kind.solve(built, plan);
    const solved = cpuMs();
    kind.mark(seed, plan, answers);
    if (n === 0) continue; // not compiled yet
    build.push(drawn - begun);
    mark.push(cpuMs() - solved);
  }
  const ends = (ms: number[]): [number, number] => [quantile(ms, 0.5), quantile(ms, 0.95)];
  return { build: ends(build), mark: ends(mark) };
}
