import { utcOf, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";
import { formatUnderstood } from "../formatUnderstood";

/** A log as it is sent: field by field, its series as lists that JSON can say. */
export function shownLog({ startUnixMs, intervalS, readings, trackEvery, passes }: ReceiverLog) {
  return {
    startUnixMs,
    intervalS,
    readings,
    trackEvery,
    passes: passes.map(({ prn, first, cn0DbHz, azimuthDeg, elevationDeg }) => ({
      prn,
      first,
      cn0DbHz: [...cn0DbHz],
      azimuthDeg: [...azimuthDeg],
      elevationDeg: [...elevationDeg],
    })),
  };
}

/** When it was kept, in words. */
export const logTimes = (log: ReceiverLog) => [
  {
    label: "First reading",
    value: `${new Date(log.startUnixMs).toISOString().slice(0, 10)}, ${utcOf(log, 0)} UTC`,
  },
  { label: "Last reading", value: `${utcOf(log, log.readings - 1)} UTC` },
  { label: "Readings", value: `every ${formatUnderstood(log.intervalS, "s")}` },
];
