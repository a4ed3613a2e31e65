import { turnDeg } from "@/lib/gnss/sky/receiverLog";
import type { LostDecibelsTruth } from "./drawCase";
import { readFault } from "./readFault";

/** Beyond these the careful reading itself would use up what the tolerances leave to people. */
const MOST_READINGS_OFF = 1;
const MOST_SLOW_SHARE_OFF = 0.06;
const MOST_DEPTH_OFF_DB = 0.6;
const MOST_AZIMUTH_OFF_DEG = 6;

/** Whether the careful reading finds in the log what was put into it, with room for a less careful one. */
export function isReadable({
  cause,
  fault,
  log,
  gainDb,
}: Pick<LostDecibelsTruth, "cause" | "fault" | "log" | "gainDb">) {
  const read = readFault(log, gainDb);
  if (read.cause !== cause) return false;
  if (!fault || !read.readings) return !fault && !read.readings;
  const [first, last] = fault.readings;
  const startOff = fault.slow ? MOST_SLOW_SHARE_OFF * (last - first) : MOST_READINGS_OFF;
  const edges = fault.sector
    ? [turnDeg(fault.sector.fromDeg, read.fromDeg), turnDeg(fault.sector.toDeg, read.toDeg)]
    : [];
  return (
    Math.abs(read.readings[0] - first) <= startOff &&
    Math.abs(read.readings[1] - last) <= MOST_READINGS_OFF &&
    Math.abs(read.depthDb - fault.depthDb) <= MOST_DEPTH_OFF_DB &&
    edges.every((off) => Math.abs(off) <= MOST_AZIMUTH_OFF_DEG)
  );
}
