import { bandMeans, utcOf, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";
import type { Answers, PublicCase } from "../kind";
import { readFault, type FaultReading } from "./readFault";

/** What a careful person reads off the log. */
export type LogReading = FaultReading & { highDbHz: number; lowDbHz: number };

/** The right method, from the public case alone: gain control first, then the satellites one by one. */
export const solve = (publicCase: PublicCase): Answers => answersFor(logOf(publicCase), readCase(publicCase));

export const logOf = ({ data }: PublicCase): ReceiverLog => data.log as ReceiverLog;

export function readCase({ data }: PublicCase): LogReading {
  const log = data.log as ReceiverLog;
  const found = readFault(log, data.gainDb as number[]);
  const bands = bandMeans(log, found.readings);
  return { ...found, highDbHz: bands[5].meanDbHz, lowDbHz: bands[1].meanDbHz };
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
