import type { BearingLine } from "@/lib/gnss/interference/bearingFix";

/** A line of the patrol log; nulls where nothing was heard. */
export type LogRow = {
  stop: number;
  timeUtc: string;
  eastM: number;
  northM: number;
  bearingDeg: number | null;
  spreadDeg: number | null;
  levelDbm: number | null;
};

export type HeardRow = LogRow & { bearingDeg: number; spreadDeg: number; levelDbm: number };

const isHeard = (row: LogRow): row is HeardRow => row.bearingDeg !== null;

export const heardRows = (log: readonly LogRow[]): HeardRow[] => log.filter(isHeard);

/** The bearings of a log as lines on the grid. */
export const linesOf = (log: readonly LogRow[]): (BearingLine & { stop: number })[] =>
  heardRows(log).map(({ stop, eastM, northM, bearingDeg, spreadDeg }) => ({
    stop,
    eastM,
    northM,
    bearingDeg,
    sigmaDeg: spreadDeg,
  }));
