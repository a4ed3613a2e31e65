import { acquire, type Capture, type SatelliteSearch, type SearchSettings } from "@/lib/gnss/acquire";
import type { Progress } from "./kind";

/** Full search of a capture for all 32 GPS satellites, for the workings of a marking. */
export const searchCapture = (capture: Capture, settings: SearchSettings, progress?: Progress): SatelliteSearch[] =>
  acquire(capture, { ...settings, prns: ALL_PRNS }, (done, total) =>
    progress?.(done, total, "Searching 32 satellites"),
  );

export const ALL_PRNS: readonly number[] = Array.from({ length: 32 }, (_, n) => n + 1);
