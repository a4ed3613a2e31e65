import { elevationAt, type Pass, type ReceiverLog, type Readings } from "@/lib/gnss/sky/receiverLog";
import { mean } from "@/lib/numeric/statistics";

const AROUND = 12;

/** How far C/N0 falls at one reading and comes back at another: the mean over the satellites that are tracked on both sides. */
export function depthOfStep(log: ReceiverLog, [first, last]: Readings): number {
  const falls = stepsAt(log, first).map((step) => -step);
  const returns = last + 1 < log.readings ? stepsAt(log, last + 1) : [];
  const all = [...falls, ...returns];
  return all.length > 0 ? mean(all) : NaN;
}

const stepsAt = ({ passes }: ReceiverLog, reading: number): number[] =>
  passes.flatMap((pass) => stepOf(pass, reading - pass.first) ?? []);

/** Mean of the readings from one of a pass on less that of those before it; null where some of them are missing. */
export function stepOf({ cn0DbHz }: Pass, at: number): number | null {
  if (at < AROUND || at + AROUND > cn0DbHz.length) return null;
  const isTracked = (cn0: number | null): cn0 is number => cn0 !== null;
  const before = cn0DbHz.slice(at - AROUND, at).filter(isTracked);
  const after = cn0DbHz.slice(at, at + AROUND).filter(isTracked);
  return before.length === AROUND && after.length === AROUND ? mean(after) - mean(before) : null;
}

const BAND_DEG = 5;

/** Depth of a slow fall at its end: what the last readings have less than satellites of their elevation had before it. */
export function depthOfCreep(log: ReceiverLog, [first, last]: Readings): number {
  const bandOf = (pass: Pass, reading: number) => Math.floor(elevationAt(pass, log.trackEvery, reading) / BAND_DEG);
  const before = Array.from({ length: 90 / BAND_DEG + 1 }, (): number[] => []);
  for (const pass of log.passes)
    pass.cn0DbHz.forEach((cn0, at) => {
      const reading = pass.first + at;
      if (cn0 !== null && reading < first) before[bandOf(pass, reading)].push(cn0);
    });
  const usual = before.map((levels) => (levels.length >= AROUND ? mean(levels) : NaN));
  const span = last - first;
  const missing: number[] = [];
  for (const pass of log.passes)
    for (let reading = Math.max(pass.first, last - Math.round(span / 10)); reading <= last; reading++) {
      const cn0 = pass.cn0DbHz[reading - pass.first];
      if (cn0 === null || cn0 === undefined) continue;
      // What is still to come is put on at once: the fall grows evenly.
      const depthDb = ((usual[bandOf(pass, reading)] - cn0) * span) / (reading - first);
      if (!Number.isNaN(depthDb)) missing.push(depthDb);
    }
  return missing.length > 0 ? mean(missing) : NaN;
}
