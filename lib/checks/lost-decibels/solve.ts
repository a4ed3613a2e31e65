import { bandMeans, directionAt, utcOf, wrapDeg, type ReceiverLog, type Readings } from "@/lib/gnss/sky/receiverLog";
import type { Answers, PublicCase } from "../kind";
import { isInSector } from "../receiver-log/sector";
import type { Cause } from "./quantities";
import { readBlockage } from "./readBlockage";
import { depthOfCreep, depthOfStep } from "./readDepth";
import { readGain } from "./readGain";

/** What a careful person reads off the log. */
export type LogReading = {
  cause: Cause;
  readings: Readings | null;
  fromDeg: number;
  toDeg: number;
  depthDb: number;
  /** Of the gain control, whatever the cause. */
  gainDb: number;
  highDbHz: number;
  lowDbHz: number;
};

/** The right method, from the public case alone: gain control first, then the satellites one by one. */
export const solve = (publicCase: PublicCase): Answers => answersFor(logOf(publicCase), readCase(publicCase));

export const logOf = ({ data }: PublicCase): ReceiverLog => data.log as ReceiverLog;

export function readCase({ data }: PublicCase): LogReading {
  const log = data.log as ReceiverLog;
  const found = readFault(log, data.gainDb as number[]);
  const bands = bandMeans(log, found.readings);
  return { ...found, highDbHz: bands[5].meanDbHz, lowDbHz: bands[1].meanDbHz };
}

function readFault(log: ReceiverLog, gainDb: readonly number[]): Omit<LogReading, "highDbHz" | "lowDbHz"> {
  const gain = readGain(gainDb);
  const allRound = { fromDeg: 0, toDeg: 360, readings: gain.readings, gainDb: gain.byDb };
  if (gain.change === "creeps") return { cause: "water", ...allRound, depthDb: depthOfCreep(log, gain.readings!) };
  if (gain.change !== "none")
    return {
      cause: gain.change === "down" ? "interference" : "loss",
      ...allRound,
      depthDb: depthOfStep(log, gain.readings!, () => true),
    };
  const blocked = readBlockage(log);
  if (!blocked) return { cause: "nothing", readings: null, fromDeg: 0, toDeg: 0, depthDb: 0, gainDb: 0 };
  const depthDb = depthOfStep(log, blocked.readings, (pass, reading) => {
    const { azimuthDeg, elevationDeg } = directionAt(pass, log.trackEvery, reading);
    return (
      elevationDeg < 57 && isInSector({ fromDeg: blocked.fromDeg + 2, toDeg: blocked.toDeg - 2 }, wrapDeg(azimuthDeg))
    );
  });
  return { cause: "blockage", ...blocked, depthDb, gainDb: 0 };
}

/** Written down as people do. */
export function answersFor(log: ReceiverLog, reading: LogReading): Answers {
  const { cause, readings, fromDeg, toDeg, depthDb, highDbHz, lowDbHz } = reading;
  return {
    "fault.cause": cause,
    "fault.start": readings ? utcOf(log, readings[0]) : "none",
    "fault.stop": readings ? utcOf(log, readings[1]) : "none",
    "fault.azimuthFrom": fromDeg.toFixed(0),
    "fault.azimuthTo": toDeg.toFixed(0),
    "fault.depth": depthDb.toFixed(1),
    "fault.act": cause,
    "pattern.high": highDbHz.toFixed(1),
    "pattern.low": lowDbHz.toFixed(1),
  };
}
