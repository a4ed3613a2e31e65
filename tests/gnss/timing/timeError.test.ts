import { describe, expect, test } from "vitest";
import {
  holdoverLimitNs,
  MAX_TIME_ERROR_NS,
  mtieLimitNs,
  tdevLimitNs,
  type ClockClass,
} from "@/lib/gnss/timing/clockLimits";
import {
  findOutliers,
  leaveOut,
  likelySawtoothSign,
  sawtoothDeviationNs,
  takeOffSawtooth,
} from "@/lib/gnss/timing/cleanTimeError";
import { allanDeviation, modifiedAllanDeviation, timeDeviationNs, usualIntervals } from "@/lib/gnss/timing/deviations";
import { largestStep } from "@/lib/gnss/timing/largestStep";
import { maskMargin } from "@/lib/gnss/timing/maskMargin";
import { mtieNs } from "@/lib/gnss/timing/mtie";
import { seriesOfLog } from "@/lib/gnss/timing/seriesOfLog";
import { summarizeTimeError, type TimeErrorSeries } from "@/lib/gnss/timing/timeError";
import { seededRandom } from "@/lib/numeric/random";
import { formulaCases } from "@/tests/reference/formulaCases";
import { STABILITY_SAMPLE_DEVIATIONS, stabilitySampleFrequencies } from "@/tests/reference/stability-sample";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

const series = (values: number[], intervalS = 1): TimeErrorSeries => ({
  intervalS,
  valuesNs: Float64Array.from(values),
});

describe("deviations", () => {
  const phases = [0];
  for (const frequency of stabilitySampleFrequencies()) phases.push(phases[phases.length - 1] + frequency);
  const sample = series(phases.map((seconds) => seconds * 1e9));

  // NIST SP 1065, 12.4; printed to seven figures, half a unit of which is at most 5e-7.
  test.each(STABILITY_SAMPLE_DEVIATIONS)("of the published sample over $intervals", (row) => {
    expectNearRelative(allanDeviation(sample, row.intervals), row.allan, 5e-7, "Allan");
    expectNearRelative(modifiedAllanDeviation(sample, row.intervals), row.modified, 5e-7, "modified Allan");
    expectNearRelative(timeDeviationNs(sample, row.intervals) * 1e-9, row.time, 5e-7, "time");
  });

  test("know nothing of an offset or a frequency offset, and the Allan deviation of a drift is D tau/sqrt 2", () => {
    const steady = series(Array.from({ length: 400 }, (_, n) => 37 + 0.25 * n));
    expectNear(timeDeviationNs(steady, 20), 0, 1e-9, "TDEV");
    expectNear(allanDeviation(steady, 20) * 1e9, 0, 1e-9, "ADEV");
    const drifting = series(Array.from({ length: 400 }, (_, n) => (1e-3 * n * n) / 2));
    // NIST SP 1065, 5.13 (from memory).
    expectNearRelative(allanDeviation(drifting, 20), (1e-12 * 20) / Math.SQRT2, 1e-9, "ADEV of a drift");
  });

  test("skip what a missing reading enters", () => {
    const holed = leaveOut(sample, [17, 400, 401]);
    expectNearRelative(timeDeviationNs(holed, 10), timeDeviationNs(sample, 10), 0.05, "TDEV");
    expectNearRelative(allanDeviation(holed, 10), allanDeviation(sample, 10), 0.05, "ADEV");
    expect(timeDeviationNs(series([NaN, NaN, NaN]), 1)).toBeNaN();
  });

  test("are stated over 1, 2, 5, 10 ... intervals and refused beyond the series", () => {
    expect(usualIntervals(60)).toEqual([1, 2, 5, 10, 20, 50]);
    expect(() => allanDeviation(sample, 501)).toThrow(RangeError);
    expect(() => timeDeviationNs(sample, 334)).toThrow(RangeError);
    expect(() => timeDeviationNs(sample, 0)).toThrow(RangeError);
  });
});

describe("MTIE", () => {
  // ITU-T G.810, 4.5.13: the definition, taken literally.
  const byDefinition = (values: number[], n: number) => {
    let largest = 0;
    for (let k = 0; k + n < values.length; k++) {
      const window = values.slice(k, k + n + 1).filter((value) => !Number.isNaN(value));
      if (window.length > 0) largest = Math.max(largest, Math.max(...window) - Math.min(...window));
    }
    return largest;
  };

  test("is the largest peak-to-peak of any window", () => {
    const random = seededRandom("5".repeat(64), "mtie");
    const values = Array.from({ length: 300 }, (_, n) => random.gaussian() + Math.sin(n / 30) * 3);
    values[40] = values[41] = NaN;
    for (const n of [1, 2, 7, 50, 299]) expect(mtieNs(series(values), n)).toBe(byDefinition(values, n));
  });

  test("grows with the interval, shows a frequency offset and no offset", () => {
    const ramp = series(Array.from({ length: 100 }, (_, n) => 500 + 2 * n));
    expect([1, 10, 99].map((n) => mtieNs(ramp, n))).toEqual([2, 20, 198]);
    expect(() => mtieNs(ramp, 100)).toThrow(RangeError);
  });
});

describe("limits", () => {
  const clockOf = (value: unknown) => `PRTC-${value}` as Exclude<ClockClass, "ePRTC-A">;

  // C02, C03: ITU-T G.8272, Fig. 1 and 2, and G.811; slope of the B class from memory.
  test.each(formulaCases("C02"))("$name", ({ given, expected }) =>
    expectNearRelative(mtieLimitNs(clockOf(given.class), given.tau_s), expected.ns, 2e-5, "MTIE"),
  );
  test.each(formulaCases("C03"))("$name", ({ given, expected }) =>
    expectNearRelative(tdevLimitNs(clockOf(given.class), given.tau_s), expected.ns, 2e-5, "TDEV"),
  );

  // ITU-T G.811: 0.275e-3 tau + 0.025 us below 1000 s, then 1e-5 tau + 0.29 us; both give 300 ns at 1000 s.
  test("of a primary reference clock meet at 1000 s", () => {
    expectNear(mtieLimitNs("PRC", 999.999), 300, 1e-3, "below");
    expectNear(mtieLimitNs("PRC", 1000), 300, 1e-9, "above");
    expectNear(tdevLimitNs("PRC", 1e4), 30, 1e-9, "TDEV");
    expect(() => mtieLimitNs("PRC", 0.1)).toThrow(RangeError);
  });

  // ITU-T G.8272 and G.8272.1, figures in public copies.
  test("of the locked clock and of its holdover", () => {
    expect([MAX_TIME_ERROR_NS["PRTC-A"], MAX_TIME_ERROR_NS["PRTC-B"], MAX_TIME_ERROR_NS["ePRTC-A"]]).toEqual([
      100, 40, 30,
    ]);
    expectNear(holdoverLimitNs(518_400, 6), 100, 1e-9, "after six days");
    expectNear(holdoverLimitNs(1_728_000, 40), 65, 1e-9, "half of forty days");
    expectNear(holdoverLimitNs(0, 1), 30, 1e-12, "at the start");
    expect(() => holdoverLimitNs(80_000, 3)).toThrow(RangeError);
  });
});

describe("a log", () => {
  const random = seededRandom("6".repeat(64), "log");
  // Six hours at 10 s: mean 28 ns, a daily wave of 8 ns, noise of 1 ns, a step of 15 ns at reading 1300, two missed
  // triggers.
  const clean = Array.from(
    { length: 2160 },
    (_, n) => 28 + 8 * Math.sin((2 * Math.PI * n) / 8640) + random.gaussian() + (n >= 1300 ? 15 : 0),
  );
  const logged = [...clean];
  logged[333] += 400;
  logged[1777] -= 95;
  const log = series(logged, 10);

  test("gives up its missed triggers and keeps the step", () => expect(findOutliers(log)).toEqual([333, 1777]));

  test("shows the step where it is", () => {
    const step = largestStep(leaveOut(log, findOutliers(log)), 60)!;
    expect(Math.abs(step.index - 1300)).toBeLessThanOrEqual(1);
    expectNear(step.sizeNs, 15, 0.8, "size");
    expect(largestStep(series([1, 2, 3]), 2)).toBeNull();
  });

  test("is summed up without its mean taken off", () => {
    const summary = summarizeTimeError(series([96, NaN, 100, 104, 100]));
    expect(summary).toMatchObject({ count: 4, meanNs: 100, maxAbsNs: 104, at: 3, peakToPeakNs: 8 });
    expectNear(summary.standardDeviationNs, Math.sqrt(32 / 3), 1e-12, "standard deviation");
    expect(summarizeTimeError(series([5])).standardDeviationNs).toBe(0);
    expect(() => summarizeTimeError(series([NaN]))).toThrow(RangeError);
  });

  // A period spread evenly has a variance of period^2/12: textbook.
  test("loses its sawtooth with the right sign and doubles it with the wrong one", () => {
    const saw = Float64Array.from({ length: 4000 }, (_, n) => ((n * 0.6180339887) % 1) * 20 - 10);
    const seen = series(Array.from(saw, (value) => 5 + value));
    const deviation = (left: TimeErrorSeries) => summarizeTimeError(left).standardDeviationNs;
    expectNear(deviation(seen), sawtoothDeviationNs(50e6), 0.01, "sawtooth of 20 ns");
    expectNear(deviation(takeOffSawtooth(seen, saw, 1)), 0, 1e-9, "right sign");
    expectNear(deviation(takeOffSawtooth(seen, saw, -1)), 2 * sawtoothDeviationNs(50e6), 0.02, "wrong sign");
    expect(() => takeOffSawtooth(seen, new Float64Array(3), 1)).toThrow(RangeError);
    const opposite = series(Array.from(saw, (value, n) => 5 + 0.01 * n - value));
    expect([likelySawtoothSign(seen, saw), likelySawtoothSign(opposite, saw)]).toEqual([1, -1]);
  });

  test("becomes a series at even intervals, holes and all", () => {
    const kept = [0, 10.2, 20, 50, 59.9, 70].map((timeS, n) => ({ timeS, ns: n }));
    expectNear(seriesOfLog(kept).intervalS, 10.1, 1e-9, "interval");
    const even = seriesOfLog([0, 10, 20, 50, 60, 70].map((timeS, n) => ({ timeS: 1000 + timeS, ns: n })));
    expect(even).toEqual({ intervalS: 10, valuesNs: Float64Array.from([0, 1, 2, NaN, NaN, 3, 4, 5]) });
    expect(() => seriesOfLog([kept[0]])).toThrow(RangeError);
    expect(() => seriesOfLog([kept[1], kept[0]])).toThrow(/reading 2/);
    expect(() => seriesOfLog([...kept, { timeS: 1e9, ns: 0 }])).toThrow(RangeError);
  });
});

describe("a curve against its mask", () => {
  // PRTC-B: 40 ns from 54.5 s on, ITU-T G.8272.
  const limit = (tauS: number) => mtieLimitNs("PRTC-B", tauS);

  test("is judged by the point that comes nearest", () => {
    const near = maskMargin(
      [
        { tauS: 1, ns: 20 },
        { tauS: 100, ns: 39 },
        { tauS: 1000, ns: NaN },
      ],
      limit,
    )!;
    expect(near).toMatchObject({ within: true, tauS: 100, ns: 39, limitNs: 40 });
    expectNear(near.margin, 1 / 39, 1e-12, "margin");
    expect(
      maskMargin(
        [
          { tauS: 1, ns: 26 },
          { tauS: 100, ns: 30 },
        ],
        limit,
      ),
    ).toMatchObject({ within: false, tauS: 1 });
    expect(maskMargin([{ tauS: 1, ns: NaN }], limit)).toBeNull();
  });
});
