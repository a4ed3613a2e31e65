import { expect, test } from "vitest";
import { axisTicks } from "@/components/plots/ticks";

test.each([
  ["code phase of a whole search", 0, 1023, 500, 56, [0, 200, 400, 600, 800, 1000], 0],
  ["lags round a peak", -2, 2, 470, 56, [-2, -1.5, -1, -0.5, 0, 0.5, 1, 1.5, 2], 1],
  ["a power from 0 to 12", 0, 12, 145, 22, [0, 2, 4, 6, 8, 10, 12], 0],
  ["hundredths", 0.1, 0.2, 400, 56, [0.1, 0.12, 0.14, 0.16, 0.18, 0.2], 2],
])("%s: values a person can count in", (_what, from, to, length, gap, major, decimals) => {
  const ticks = axisTicks(from, to, length, gap);
  expect(ticks.major).toEqual(major);
  expect(ticks.decimals).toBe(decimals);
});

test("labelled ticks keep their distance at any width", () => {
  for (const width of [120, 260, 358, 640, 1360]) {
    for (const [from, to] of [
      [-10, 40],
      [0, 1023],
      [-5125, 5125],
      [402, 422],
      [0, 0.03],
    ]) {
      const { major } = axisTicks(from, to, width, 56);
      const gaps = major.slice(1).map((value, at) => ((value - major[at]) / (to - from)) * width);
      for (const gap of gaps) expect(gap).toBeGreaterThanOrEqual(56 * (1 - 1e-9));
    }
  }
});

test("minor ticks divide the labelled ones evenly and never stand on them", () => {
  const { major, minor } = axisTicks(0, 1000, 640, 56);
  expect(major.slice(0, 3)).toEqual([0, 100, 200]);
  expect(minor.slice(0, 5)).toEqual([20, 40, 60, 80, 120]);
});

test("an axis without extent has no ticks", () => {
  expect(axisTicks(3, 3, 400, 56).major).toEqual([]);
  expect(axisTicks(0, NaN, 400, 56).major).toEqual([]);
});
