import { expect, test } from "vitest";
import { parseCodePhase } from "@/lib/checks/parseCodePhase";
import { expectNear } from "@/tests/support/expectNear";

// One C/A chip is 1/1.023 us = 0.97752 us and 293.05 m (IS-GPS-200, 3.3.2.1; speed of light 299 792 458 m/s, SI).
test.each([
  ["412.5", 412.5],
  ["412,5 chip", 412.5],
  ["0.97752 us", 1],
  ["977.52 ns", 1],
  ["293.05 m", 1],
  ["0.5 ms", 511.5],
])("%s is %d chip", (text, chips) => {
  const reading = parseCodePhase(text);
  expectNear("value" in reading ? reading.value : NaN, chips, 2e-5 * chips, text);
});

test("says what a code phase is in when nothing fits", () =>
  expect(parseCodePhase("5 Hz")).toEqual({ problem: "Hz does not fit. This quantity is in chip." }));
