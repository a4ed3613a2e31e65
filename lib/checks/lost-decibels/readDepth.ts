import { elevationAt, type Pass, type ReceiverLog, type Readings } from "@/lib/gnss/sky/receiverLog";
import { mean } from "@/lib/numeric/statistics";

const AROUND = 12;

/** How far C/N0 falls at one reading and comes back at another: the mean over the satellites that are tracked on both sides. */
export function depthOfStep(
  log: ReceiverLog,
  readings: Readings,
  fell: (pass: Pass, reading: number) => boolean,
): number {
  const [first, last] = readings;
  const falls = stepsAt(log, first, fell).map((step) => -step);
  const returns = last + 1 < log.readings ? stepsAt(log, last + 1, (pass) => fell(pass, last)) : [];
  const all = [...falls, ...returns];
  return all.length > 0 ? mean(all) : NaN;
}

function stepsAt({ passes }: ReceiverLog, reading: number, fell: (pass: Pass, reading: number) => boolean): number[] {
  return passes.flatMap((pass) => {
    const at = reading - pass.first;
    if (at < AROUND || at + AROUND > pass.cn0DbHz.length || !fell(pass, reading)) return [];
    const before = pass.cn0DbHz.slice(at - AROUND, at);
    const after = pass.cn0DbHz.slice(at, at + AROUND);
    const isTracked = (cn0: number | null): cn0 is number => cn0 !== null;
    if (!before.every(isTracked) || !after.every(isTracked)) return [];
    return [mean(after) - mean(before)];
  });
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
