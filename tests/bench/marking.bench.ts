import { readCapture } from "@/lib/checks/captureFiles";
import { falseLock } from "@/lib/checks/false-lock/falseLock";
import { REFERENCE_SEARCH as FALSE_LOCK_SEARCH } from "@/lib/checks/false-lock/referenceSearch";
import type { CheckKind } from "@/lib/checks/kind";
import { REFERENCE_SEARCH } from "@/lib/checks/satellites/referenceSearch";
import { satellites } from "@/lib/checks/satellites/satellites";
import { satellitesTrial } from "@/lib/checks/satellites/trial";
import { searchCapture } from "@/lib/checks/searchCapture";
import type { SearchSettings } from "@/lib/gnss/acquire";
import { median } from "@/lib/numeric/statistics";
import { planOf, seedOf } from "../checks/planOf";
import type { TableBench } from "./bench";
import { cpuMs } from "./cpuMs";

const ROUNDS = 5;
const AIM = 1.2;
const SEED = seedOf(11);

/** The search that a marking runs beside the scene, alone and as part of the marking, in turns. */
function measure(kind: CheckKind, settings: SearchSettings): string[] {
  const plan = planOf(kind);
  const capture = readCapture(kind.build(SEED, plan).files);
  const ways = {
    search: () => searchCapture(capture, settings),
    making: () => kind.build(SEED, plan),
    marking: () => kind.mark(SEED, plan, {}),
  };
  const ms = { search: [] as number[], making: [] as number[], marking: [] as number[] };
  for (let round = -1; round < ROUNDS; round++) {
    for (const [name, way] of Object.entries(ways) as [keyof typeof ways, () => unknown][]) {
      const started = cpuMs();
      way();
      if (round >= 0) ms[name].push(cpuMs() - started);
    }
  }
  const [search, making, marking] = [median(ms.search), median(ms.making), median(ms.marking)];
  return [
    kind.id,
    search.toFixed(0),
    making.toFixed(0),
    marking.toFixed(0),
    (marking / search).toFixed(2),
    `${AIM}${marking > AIM * search ? ", missed" : ""}`,
  ];
}

export const bench: TableBench = {
  title: "marking of the search kinds against the engine's own search of the same capture",
  table: async () => [
    ["kind", "search CPU ms", "making the capture", "marking", "marking to search", "aim"],
    measure(satellites as CheckKind, {
      ...REFERENCE_SEARCH,
      dopplerHalfWidthHz: satellitesTrial.build(SEED, planOf(satellites)).truth.windowHz,
    }),
    measure(falseLock as CheckKind, FALSE_LOCK_SEARCH),
  ],
  notes: async () => ["A marking makes the capture again from its seed, searches it and compares."],
};
