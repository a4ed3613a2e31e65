import type { Bench } from "@/tests/bench/bench";
import { startTwin } from "./startTwin";

export type Comparison = { rows: string[][]; notes: string[]; differences: string[] };

const WARM_MS = 1500;
const MOST_WARM_ROUNDS = 50;

/** The fastest rounds say what a busy machine hides in the medians. */
const HEADING = ["", "median ms", "ratio", "of the fastest", "target"];

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
    const reference = median(theirs);
    const rows = contest.contenders.map(({ name, target }, n) => {
      const ratio = median(ours[n]) / reference;
      const best = Math.min(...ours[n]) / Math.min(...theirs);
      const verdict = target === null ? "" : ratio <= target ? `within ${target}` : `MISSED ${target}`;
      return [name, milliseconds(median(ours[n])), ratio.toFixed(2), best.toFixed(2), verdict];
    });
    return {
      rows: [HEADING, ["reference", milliseconds(reference), "1.00", "1.00", ""], ...rows],
      notes: (await contest.notes?.()) ?? [],
      differences: contest.differences(answers, await twin.result()),
    };
  } finally {
    twin.end();
    await contest.close?.();
  }
}

const milliseconds = (seconds: number) => (seconds * 1000).toFixed(seconds < 0.1 ? 2 : 0);

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}
