import { KINDS } from "@/lib/checks/registry";
import type { TableBench } from "./bench";
import { inFreshProcess } from "./inFreshProcess";
import type { KindTimes } from "./kindTimes";

/** Captures take seconds; of the others both drawing and marking are to stay under this, ms. */
const SEARCH_KINDS = ["satellites", "false-lock"];
const AIM_MS = 50;

export const bench: TableBench = {
  title: "drawing a case and marking it, by kind: CPU ms (half of the cases, 95 of 100 stay under), memory",
  async table() {
    const rows = KINDS.filter(({ trial, ofPlan }) => trial && !ofPlan).map(({ id }) => {
      const searches = SEARCH_KINDS.includes(id);
      const { value, megabytes } = inFreshProcess<KindTimes>("kindTimes.ts", "kindTimes", id, searches ? 4 : 40);
      const missed = !searches && Math.max(value.build[0], value.mark[0]) > AIM_MS;
      const aim = searches ? "–" : `${AIM_MS}${missed ? ", missed" : ""}`;
      return [id, ...[...value.build, ...value.mark].map((ms) => ms.toFixed(1)), megabytes.toFixed(0), aim];
    });
    return [["kind", "drawn 50 %", "drawn 95 %", "marked 50 %", "marked 95 %", "MB", "aim ms"], ...rows];
  },
  notes: async () => [
    "A marking draws the case again from its seed. Memory is the peak of a process that does nothing else.",
  ],
};
