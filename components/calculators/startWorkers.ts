import { TELLS_FILES } from "./workers/filesName";

/*
 * One line a worker: the build finds them by the address written out. They are all started here, so that the bench can keep
 * them for use without a network.
 */
export const startCaptureWorker = (name?: string) =>
  new Worker(new URL("./workers/capture.worker.ts", import.meta.url), { type: "module", name });
export const startFalseLockWorker = (name?: string) =>
  new Worker(new URL("./workers/falseLock.worker.ts", import.meta.url), { type: "module", name });
export const startPlanWorker = (name?: string) =>
  new Worker(new URL("./workers/plan.worker.ts", import.meta.url), { type: "module", name });
export const startPulseWorker = (name?: string) =>
  new Worker(new URL("./workers/pulse.worker.ts", import.meta.url), { type: "module", name });

const BENCH_WORKERS = [startCaptureWorker, startFalseLockWorker, startPlanWorker, startPulseWorker];
const LONGEST_MS = 20_000;

/** Paths of all scripts that the workers of the bench are made of; one that does not start in time is left out. */
export async function filesOfWorkers(): Promise<string[]> {
  const files = new Set<string>();
  for (const start of BENCH_WORKERS) for (const path of await filesOf(start)) files.add(path);
  return [...files];
}

/** One after the other: this is done while nobody waits for it. */
async function filesOf(start: (name: string) => Worker): Promise<string[]> {
  const worker = start(TELLS_FILES);
  try {
    return await new Promise((resolve) => {
      worker.addEventListener("message", ({ data }: MessageEvent<string[]>) => resolve(data));
      worker.addEventListener("error", () => resolve([]));
      setTimeout(() => resolve([]), LONGEST_MS);
    });
  } finally {
    worker.terminate();
  }
}
