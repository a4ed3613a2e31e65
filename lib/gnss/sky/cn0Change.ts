import { mean } from "@/lib/numeric/statistics";
import type { ReceiverLog } from "./receiverLog";

const WINDOW_S = 60;
/** Between the start and either minute, so that a cursor a reading or two beside it changes nothing. */
const GAP_S = 20;

export type SatelliteChange = { prn: number; beforeDbHz: number; afterDbHz: number };

/**
 * Mean C/N0 of the minute that ends 20 s before a reading and of the minute that begins 20 s after it, for every satellite
 * that is tracked through both; dB-Hz, means of the figures as they stand in the log.
 */
export function changesAt({ passes, intervalS }: ReceiverLog, reading: number): SatelliteChange[] {
  const window = Math.round(WINDOW_S / intervalS);
  const gap = Math.round(GAP_S / intervalS);
  return passes.flatMap(({ prn, first, cn0DbHz }) => {
    const at = reading - first;
    if (at < gap + window || at + gap + window > cn0DbHz.length) return [];
    const minutes = [cn0DbHz.slice(at - gap - window, at - gap), cn0DbHz.slice(at + gap, at + gap + window)];
    const [before, after] = minutes.map((minute) => minute.filter((cn0) => cn0 !== null));
    if (before.length < window || after.length < window) return [];
    return [{ prn, beforeDbHz: mean(before), afterDbHz: mean(after) }];
  });
}

/** Mean over the satellites of what `changesAt` finds, in dB; NaN where there is none. */
export function meanChangeDb(log: ReceiverLog, reading: number): number {
  const changes = changesAt(log, reading).map(({ beforeDbHz, afterDbHz }) => afterDbHz - beforeDbHz);
  return changes.length > 0 ? mean(changes) : NaN;
}
