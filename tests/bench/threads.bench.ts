import type { CheckKind } from "@/lib/checks/kind";
import { kindOf } from "@/lib/checks/registry";
import { EngineThreads } from "@/lib/worker/EngineThreads";
import { planOf, seedOf } from "../checks/planOf";
import type { TableBench } from "./bench";

/** So many markings of a kind, and what two threads must do for one; null where a marking is over before it pays. */
const TASKS: [kind: string, markings: number, aim: number | null][] = [
  ["satellites", 6, 1.6],
  ["false-lock", 6, 1.6],
  ["chain", 200, null],
];

/** Hand-ins marked by the worker's own threads, as many on their way as there are threads. */
async function markingsPerSecond(kind: CheckKind, markings: number, count: number): Promise<number> {
  const threads = new EngineThreads(count);
  const plan = planOf(kind);
  const mark = (n: number) =>
    threads.run({ seedHex: seedOf(n), plan, answers: {} }, () => undefined, new AbortController().signal);
  try {
    threads.warm();
    // Loaded and compiled before it counts.
    await Promise.all(Array.from({ length: count }, (_, n) => mark(n)));
    const started = performance.now();
    let next = 0;
    const work = async () => {
      while (next < markings) await mark(next++);
    };
    await Promise.all(Array.from({ length: count }, work));
    return (1000 * markings) / (performance.now() - started);
  } finally {
    await threads.stop();
  }
}

export const bench: TableBench = {
  title: "markings per second with one and with two threads of the worker",
  async table() {
    const rows: string[][] = [];
    for (const [id, markings, aim] of TASKS) {
      const one = await markingsPerSecond(kindOf(id), markings, 1);
      const two = await markingsPerSecond(kindOf(id), markings, 2);
      const missed = aim !== null && two < aim * one ? ", missed" : "";
      rows.push([id, one.toFixed(2), two.toFixed(2), (two / one).toFixed(2), aim === null ? "–" : `${aim}${missed}`]);
    }
    return [["kind", "one thread", "two threads", "two to one", "aim"], ...rows];
  },
  notes: async () => [
    "The worker draws the case again before it marks it, to hold its truth against the one that was sealed.",
  ],
};
