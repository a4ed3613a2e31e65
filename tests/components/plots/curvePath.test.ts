import { expect, test } from "vitest";
import { curvePath } from "@/components/plots/curvePath";

const g = { x: (value: number) => value, y: (value: number) => -value, left: 0, right: 100 };

test("few points are joined as they are, to hundredths of a px", () => {
  expect(curvePath({ x: [0, 10, 20], y: [0, 1.23456, 0] }, g)).toBe("M0 0L10 -1.23L20 0");
});

test("a value that is not a number breaks the line", () => {
  expect(curvePath({ x: [0, 1, 2, 3], y: [5, NaN, 6, 7] }, g)).toBe("M0 -5M2 -6L3 -7");
});

test("of many points no peak one sample wide is lost", () => {
  const count = 10_000;
  const x = Float64Array.from({ length: count }, (_, at) => (at * 100) / count);
  const y = new Float64Array(count);
  y[7_531] = 31.6;
  y[2_002] = -4;
  const path = curvePath({ x, y }, g);
  expect(path).toContain(" -31.6");
  expect(path).toContain(" 4");
  expect(path.split("L").length).toBeLessThan(4 * 101);
});

// A day of readings with a gap was drawn as a path with NaN in it, which shows nothing at all.
test("of many points as well a value that is not a number breaks the line", () => {
  const count = 10_000;
  const x = Float64Array.from({ length: count }, (_, at) => (at * 100) / count);
  const y = new Float64Array(count).fill(1);
  y.fill(NaN, 3_000, 5_000);
  const path = curvePath({ x, y }, g);
  expect(path).not.toContain("NaN");
  expect(path.match(/M/g)).toHaveLength(2);
  expect(path).toMatch(/L29\.99 -1M50 -1L/);
});
