import { falsePeaks, type FalseLockQuestion, type FalsePeak } from "@/lib/gnss/falseLock";
import { falsePeakMap, type FalsePeakMap } from "@/lib/gnss/falsePeakMap";

export type FalseLockRequest = { run: number; question: FalseLockQuestion };
export type FalseLockAnswer = { run: number; peaks: FalsePeak[]; map: FalsePeakMap };

addEventListener("message", ({ data: { run, question } }: MessageEvent<FalseLockRequest>) => {
  const map = falsePeakMap(question);
  postMessage({ run, peaks: falsePeaks(question), map } satisfies FalseLockAnswer, { transfer: [map.power.buffer] });
});
