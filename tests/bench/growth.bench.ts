import { searchSatellites } from "@/lib/gnss/search/searchSatellites";
import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { synthesizeBlocks } from "@/lib/gnss/synthesize";
import { seededRandom } from "@/lib/numeric/random";
import type { TableBench } from "./bench";
import { eightSatellites } from "./eightSatellites";
import { inFreshProcess } from "./inFreshProcess";

const RATE_HZ = 4.092e6;
const STEPS: [number, number][] = [
  [1, 8],
  [10, 8],
  [100, 8],
  [1000, 8],
  [100, 1],
  [100, 4],
  [100, 16],
  [100, 32],
];

type Measured = { synthesisMs: number; searchMs: number; megabytes: number };

/** Makes a capture and searches it for as many satellites as are in it; seconds of either, in a process of its own. */
export function measureGrowth(durationMs: number, count: number): Omit<Measured, "megabytes"> {
  const satellites = Array.from({ length: count }, (_, n) => ({ ...eightSatellites()[n % 8], prn: n + 1 }));
  const samples = new Int8Array((2 * RATE_HZ * durationMs) / 1000);
  const scene = { rateHz: RATE_HZ, durationMs, ifHz: 0 as const, satellites };
  const started = performance.now();
  let at = 0;
  for (const block of synthesizeBlocks(scene, seededRandom("6a".repeat(32), "noise"))) {
    samples.set(block, at);
    at += block.length;
  }
  const made = performance.now();
  searchSatellites(
    { samples, complex: true, rateHz: RATE_HZ, ifHz: 0 },
    searchSignalOf(gpsL1Ca),
    satellites.map(({ prn }) => prn),
    { coherentMs: 1, sums: durationMs, dopplerHalfWidthHz: 5000, dopplerStepHz: 500, falseAlarmPerSearch: 1e-3 },
  );
  return { synthesisMs: made - started, searchMs: performance.now() - made };
}

export const bench: TableBench = {
  title: "growth of synthesis and search (21 Doppler rows, 1 ms sums) at 4.092 Msps, each line in a fresh process",
  async table() {
    const rows = STEPS.map(([durationMs, count]) => {
      const { value, megabytes } = inFreshProcess<Measured>("./growth.bench.ts", "measureGrowth", durationMs, count);
      const perUnit = value.searchMs / durationMs / count;
      return [
        `${durationMs} ms, ${count} satellite${count > 1 ? "s" : ""}`,
        value.synthesisMs.toFixed(0),
        value.searchMs.toFixed(0),
        perUnit.toFixed(2),
        megabytes.toFixed(0),
      ];
    });
    return [["capture", "synthesis ms", "search ms", "per ms and satellite", "peak MB"], ...rows];
  },
  notes: async () => [
    "The samples themselves are 8 MB a second; a short run is dominated by code that is not compiled yet.",
  ],
};
