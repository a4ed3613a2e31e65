import { expect, test } from "vitest";
import { holdoverLimitNs } from "@/lib/gnss/timing/clockLimits";
import { holdoverErrorNs, holdoverUncertaintyNs, timeToLimitS, type Holdover } from "@/lib/gnss/timing/holdover";
import { expectNear } from "@/tests/support/expectNear";

const STILL: Holdover = {
  startNs: 0,
  frequencyOffset: 0,
  driftPerDay: 0,
  temperatureCoefficientPerK: 0,
  temperatureChangeK: 0,
  dailySwingK: 0,
};
const CERTAIN = { startNs: 0, frequencyOffset: 0, driftPerDay: 0, allanFloor: 0 };

// x = x0 + y0 t + D t^2/2, ITU-T G.810, by hand: 1e-11 over 1000 s are 10 ns; 1e-10 a day make 4320 ns in a day.
test("offset, ageing and temperature move the pulse as the formula says", () => {
  expectNear(holdoverErrorNs({ ...STILL, startNs: 20, frequencyOffset: 1e-11 }, 1000), 30, 1e-9, "offset");
  expectNear(holdoverErrorNs({ ...STILL, driftPerDay: 1e-10 }, 86_400), 4320, 1e-6, "ageing");
  const warm = { ...STILL, temperatureCoefficientPerK: 2e-12, temperatureChangeK: -10 };
  expectNear(holdoverErrorNs(warm, 3600), -72, 1e-9, "temperature");
});

test("a daily wave comes back to 0 each day; its largest excursion is day/pi times the swing", () => {
  const swinging = { ...STILL, temperatureCoefficientPerK: 1e-12, dailySwingK: 5 };
  expectNear(holdoverErrorNs(swinging, 86_400), 0, 1e-9, "a day later");
  expectNear(holdoverErrorNs(swinging, 43_200), (5e-12 * 86_400 * 1e9) / Math.PI, 1e-9, "noon");
});

test("the time to a limit is that of the closed form", () => {
  const limit = (clock: Partial<Holdover>, ns: number) => timeToLimitS({ ...STILL, ...clock }, CERTAIN, ns);
  expectNear(limit({ frequencyOffset: 1e-11 }, 100), 10_000, 0.002, "frequency offset alone");
  expectNear(limit({ driftPerDay: 1e-10 }, 1500), Math.sqrt((2 * 1500e-9 * 86_400) / 1e-10), 0.002, "ageing alone");
  // An offset against the ageing first goes to -28.8 ns and only then up to 100.
  const both = limit({ frequencyOffset: -1e-12, driftPerDay: 1.5e-12 }, 100);
  expectNear(-1e-12 * both + (1.5e-12 / 86_400 / 2) * both * both, 100e-9, 1e-13, "both");
  expect(limit({}, 100)).toBe(Infinity);
  expect(limit({ startNs: -100 }, 100)).toBe(0);
});

test("uncertainty shortens it", () => {
  const unsure = { startNs: 3, frequencyOffset: 4e-12, driftPerDay: 0, allanFloor: 3e-12 };
  expectNear(holdoverUncertaintyNs(unsure, 1000), Math.hypot(3, 4, 3), 1e-9, "after 1000 s");
  const clock = { ...STILL, frequencyOffset: 1e-11 };
  const sure = timeToLimitS(clock, CERTAIN, 100);
  const doubtful = timeToLimitS(clock, unsure, 100);
  expect(doubtful).toBeLessThan(sure);
  expect(timeToLimitS(clock, unsure, 100, { coverage: 0 })).toBe(sure);
});

test("a limit may grow with the time in holdover", () => {
  const clock = { ...STILL, frequencyOffset: 1e-12 };
  const seconds = timeToLimitS(clock, CERTAIN, (afterS) => holdoverLimitNs(afterS, 40));
  expectNear(seconds * 1e-3, 30 + (70 * seconds) / 3_456_000, 1e-5, "both lines meet");
});
