import type { ReceiverLog } from "@/lib/gnss/sky/receiverLog";
import type { Satellite } from "./SatelliteStrips";

/** Every satellite of a log over the whole log: NaN where it is not in view or not tracked. By number. */
export function satellitesOf({ passes, readings }: Pick<ReceiverLog, "passes" | "readings">): Satellite[] {
  const byPrn = new Map<number, Float64Array>();
  for (const { prn, first, cn0DbHz } of passes) {
    const whole = byPrn.get(prn) ?? new Float64Array(readings).fill(NaN);
    cn0DbHz.forEach((cn0, at) => (whole[first + at] = cn0 ?? NaN));
    byPrn.set(prn, whole);
  }
  return [...byPrn].map(([prn, cn0DbHz]) => ({ prn, cn0DbHz })).sort((a, b) => a.prn - b.prn);
}
