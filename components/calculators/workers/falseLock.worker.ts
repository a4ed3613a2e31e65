import { gridOverview, type GridOverview } from "@/components/plots/gridOverview";
import { falsePeaks, type FalseLockQuestion, type FalsePeak } from "@/lib/gnss/falseLock";
import { falsePeakMap, type FalsePeakMap } from "@/lib/gnss/falsePeakMap";
import "./tellFiles";

export type FalseLockRequest = { run: number; question: FalseLockQuestion };
export type FalseLockAnswer = { run: number; peaks: FalsePeak[]; map: FalsePeakMap; overview: GridOverview };

addEventListener("message", ({ data: { run, question } }: MessageEvent<FalseLockRequest>) => {
  const map = falsePeakMap(question);
  const overview = gridOverview(map.power, map.lagsChips.length);
  const answer: FalseLockAnswer = { run, peaks: falsePeaks(question), map, overview };
  postMessage(answer, { transfer: [map.power.buffer] });
});
