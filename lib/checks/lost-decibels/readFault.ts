import type { ReceiverLog, Readings } from "@/lib/gnss/sky/receiverLog";
import type { Cause } from "./quantities";
import { readBlockage } from "./readBlockage";
import { depthOfCreep, depthOfStep } from "./readDepth";
import { readGain } from "./readGain";

export type FaultReading = {
  cause: Cause;
  readings: Readings | null;
  fromDeg: number;
  toDeg: number;
  depthDb: number;
  /** Of the gain control, whatever the cause. */
  gainDb: number;
};

/** Gain control first, then the satellites one by one. */
export function readFault(log: ReceiverLog, gainDb: readonly number[]): FaultReading {
  const gain = readGain(gainDb);
  const allRound = { fromDeg: 0, toDeg: 360, readings: gain.readings, gainDb: gain.byDb };
  if (gain.change === "creeps") return { cause: "water", ...allRound, depthDb: depthOfCreep(log, gain.readings!) };
  if (gain.change !== "none")
    return {
      cause: gain.change === "down" ? "interference" : "loss",
      ...allRound,
      depthDb: depthOfStep(log, gain.readings!),
    };
  const blocked = readBlockage(log);
  if (!blocked) return { cause: "nothing", readings: null, fromDeg: 0, toDeg: 0, depthDb: 0, gainDb: 0 };
  return { cause: "blockage", ...blocked, gainDb: 0 };
}
