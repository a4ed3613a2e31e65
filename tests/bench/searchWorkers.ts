import { once } from "node:events";
import { Worker } from "node:worker_threads";
import type { SampledCapture } from "@/lib/gnss/search/sampledCapture";
import type { SatelliteFinding } from "@/lib/gnss/search/searchSatellites";
import type { SearchRequest } from "@/lib/gnss/search/searchPlanOf";

export type SearchWork = { capture: SampledCapture; prns: readonly number[]; request: SearchRequest };

/** Threads that share out the satellites of a search; they are started once and wait. */
export async function createSearchWorkers(count: number) {
  const workers = Array.from({ length: count }, () => new Worker(new URL("./search.worker.mjs", import.meta.url)));
  await Promise.all(workers.map((worker) => once(worker, "message"))); // loaded
  const search = async (
    capture: SampledCapture,
    prns: readonly number[],
    request: SearchRequest,
  ): Promise<SatelliteFinding[]> => {
    const shares = workers.map((_, n) => prns.filter((_prn, at) => at % count === n));
    const answers = await Promise.all(
      workers.map(async (worker, n) => {
        worker.postMessage({ capture, prns: shares[n], request } satisfies SearchWork);
        const [findings] = (await once(worker, "message")) as [SatelliteFinding[]];
        return findings;
      }),
    );
    return answers.flat().sort((a, b) => a.prn - b.prn);
  };
  const end = async () => void (await Promise.all(workers.map((worker) => worker.terminate())));
  return { search, end };
}
