import type { Bench } from "@/tests/bench/bench";
import { comparisonRows } from "./comparisonRows";
import { startTwin } from "./startTwin";

export type Comparison = { rows: string[][]; notes: string[]; differences: string[] };

const WARM_MS = 1500;
const MOST_WARM_ROUNDS = 50;

/** Runs a bench and its twin in turns and sets the medians side by side. */
export async function compareWithTwin(
  bench: Bench,
  script: string,
  folder: string,
  rounds: number,
): Promise<Comparison> {
  const contest = await bench.prepare(folder);
  const twin = await startTwin(script, folder);
  try {
    const answers: unknown[] = [];
    const theirs: number[] = [];
    const ours = contest.contenders.map((): number[] => []);
    const runAll = async (keep: boolean) => {
      const seconds = await twin.run();
      if (keep) theirs.push(seconds);
      for (const [n, contender] of contest.contenders.entries()) {
        const started = performance.now();
        answers[n] = await contender.run();
        if (keep) ours[n].push((performance.now() - started) / 1000);
      }
    };
    // Short work needs more rounds before all of it is compiled.
    const warmUntil = performance.now() + WARM_MS;
    for (let round = 0; round === 0 || (round < MOST_WARM_ROUNDS && performance.now() < warmUntil); round++)
      await runAll(false);
    for (let round = 0; round < rounds; round++) await runAll(true);
    return {
      rows: comparisonRows(contest.contenders, ours, theirs),
      notes: (await contest.notes?.()) ?? [],
      differences: contest.differences(answers, await twin.result()),
    };
  } finally {
    twin.end();
    await contest.close?.();
  }
}
