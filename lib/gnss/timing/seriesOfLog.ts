import { median } from "@/lib/numeric/statistics";
import type { TimeErrorSeries } from "./timeError";

/** Readings of a log as they came. */
export type LoggedReading = { timeS: number; ns: number };

const MOST_READINGS = 2_000_000;

/**
 * A log as a series at even intervals: the interval is the median of the times between readings, each reading goes to
 * the nearest place and places without one are NaN. A second reading at one place replaces the first.
 * @param readings in the order of time, at least two
 * @throws RangeError when times run backwards or gaps would make the series longer than two million places
 */
export function seriesOfLog(readings: readonly LoggedReading[]): TimeErrorSeries {
  if (readings.length < 2) throw new RangeError(`seriesOfLog: at least two readings, got ${readings.length}`);
  const steps = readings.slice(1).map(({ timeS }, n) => timeS - readings[n].timeS);
  const backwards = steps.findIndex((step) => !(step > 0));
  if (backwards >= 0)
    throw new RangeError(
      `seriesOfLog: times that rise, got ${readings[backwards + 1].timeS} s at reading ${backwards + 2}`,
    );
  const intervalS = median(steps);
  const firstS = readings[0].timeS;
  const places = Math.round((readings[readings.length - 1].timeS - firstS) / intervalS) + 1;
  if (places > MOST_READINGS)
    throw new RangeError(`seriesOfLog: at most ${MOST_READINGS} places, got ${places} at ${intervalS} s each`);
  const valuesNs = new Float64Array(places).fill(NaN);
  for (const { timeS, ns } of readings) valuesNs[Math.round((timeS - firstS) / intervalS)] = ns;
  return { intervalS, valuesNs };
}
