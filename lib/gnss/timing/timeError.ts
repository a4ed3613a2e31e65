/** Samples of a time error at even intervals; NaN where a reading is missing or was left out. */
export type TimeErrorSeries = { intervalS: number; valuesNs: Float64Array };

export type TimeErrorSummary = {
  /** Readings present. */
  count: number;
  /** Constant part, the mean over all readings: ITU-T G.8260, cTE. */
  meanNs: number;
  /** max|TE|: ITU-T G.8260. The mean is not taken off. */
  maxAbsNs: number;
  /** Index of the reading that gives max|TE|. */
  at: number;
  standardDeviationNs: number;
  peakToPeakNs: number;
};

/** Mean, largest magnitude and spread of a time error. @throws RangeError when no reading is present */
export function summarizeTimeError({ valuesNs }: TimeErrorSeries): TimeErrorSummary {
  let [count, sum, maxAbsNs, at] = [0, 0, -1, -1];
  let [lowest, highest] = [Infinity, -Infinity];
  for (let n = 0; n < valuesNs.length; n++) {
    const value = valuesNs[n];
    if (Number.isNaN(value)) continue;
    count += 1;
    sum += value;
    lowest = Math.min(lowest, value);
    highest = Math.max(highest, value);
    if (Math.abs(value) > maxAbsNs) [maxAbsNs, at] = [Math.abs(value), n];
  }
  if (count === 0) throw new RangeError("summarizeTimeError: no reading present");
  const meanNs = sum / count;
  let squares = 0;
  for (const value of valuesNs) if (!Number.isNaN(value)) squares += (value - meanNs) * (value - meanNs);
  return {
    count,
    meanNs,
    maxAbsNs,
    at,
    standardDeviationNs: count > 1 ? Math.sqrt(squares / (count - 1)) : 0,
    peakToPeakNs: highest - lowest,
  };
}
