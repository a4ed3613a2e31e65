import type { Axis } from "@/components/plots/geometry";

export type LogTimes = { startUnixMs: number; intervalS: number; readings: number };

const STEPS_S = [300, 600, 900, 1800, 3600, 7200, 14_400];
const MOST_TICKS = 8;

/** Seconds from the midnight before the log began, so that whole hours are whole steps. */
const startS = ({ startUnixMs }: LogTimes) => Math.floor(startUnixMs / 1000) % 86_400;

export const timesS = (log: LogTimes): Float64Array =>
  Float64Array.from({ length: log.readings }, (_, reading) => startS(log) + reading * log.intervalS);

/** Time of day along a log. */
export function timeAxis(log: LogTimes): Axis {
  const from = startS(log);
  const to = from + (log.readings - 1) * log.intervalS;
  const step = STEPS_S.find((one) => (to - from) / one <= MOST_TICKS) ?? STEPS_S[STEPS_S.length - 1];
  const first = Math.ceil(from / step);
  const ticks = Array.from({ length: Math.floor(to / step) - first + 1 }, (_, n) => (first + n) * step);
  return { name: "UTC", from, to, ticks, text: hourText };
}

const two = (value: number) => String(value).padStart(2, "0");
const hourText = (secondsS: number) =>
  `${two(Math.floor(secondsS / 3600) % 24)}:${two(Math.floor(secondsS / 60) % 60)}`;
