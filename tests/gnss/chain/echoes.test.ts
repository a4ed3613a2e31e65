import { expect, test } from "vitest";
import { echoes, reflectionOf, type Line } from "@/lib/gnss/chain/echoes";
import { echoTrace } from "@/lib/gnss/chain/echoTrace";
import { readEchoTrace } from "@/lib/gnss/chain/readEchoTrace";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

const LINE: Line = { impedanceOhm: 50, velocityFactor: 0.8, lossDbPer100M: 0, faults: [] };
const NS_PER_M = 2 / (0.8 * 0.299792458);

// Reflection coefficients of textbooks: (Z - Z0)/(Z + Z0) with what the line behind the fault adds.
test.each([
  ["end", Infinity, 1],
  ["end", 0, -1],
  ["end", 50, 0],
  ["end", 75, 0.2],
  ["across", 25, -0.5],
  ["across", Infinity, -0],
  ["series", 100, 0.5],
  ["series", Infinity, 1],
] as const)("%s of %s ohm reflects %s", (kind, ohm, expected) =>
  expectNear(reflectionOf({ kind, ohm, distanceM: 1 }, 50), expected, 1e-12, "reflection"),
);

test("the open end comes back after twice the way, weakened by twice the loss", () => {
  const [echo] = echoes({ ...LINE, lossDbPer100M: 6, faults: [{ distanceM: 50, kind: "end", ohm: Infinity }] });
  expectNear(echo.delayNs, 50 * NS_PER_M, 1e-9, "time");
  expectNear(echo.height, 10 ** (-6 / 20), 1e-12, "height");
});

// A lattice diagram by hand: r1 = -0.2 (100 ohm across), end +1; 1 - 0.2 each way past the fault.
test("several faults shade each other and leave ghosts", () => {
  const faults = [
    { distanceM: 40, kind: "end", ohm: Infinity },
    { distanceM: 10, kind: "across", ohm: 100 },
  ] as const;
  const found = echoes({ ...LINE, faults });
  expect(found.map(({ ghost }) => ghost)).toEqual([false, false, true]);
  expectNear(found[0].height, -0.2, 1e-12, "fault");
  expectNear(found[1].height, 0.8 * 0.8, 1e-12, "end");
  expectNear(found[2].delayNs, 70 * NS_PER_M, 1e-9, "ghost at twice the end less the fault");
  expectNear(found[2].height, 0.8 * 1 * -0.2 * 1 * 0.8, 1e-12, "ghost");
});

test("all that is sent comes back at last: the heights at an open end add up to what a meter reads", () => {
  // 100 ohm across an open line: the settled reflection is that of 100 ohm, 1/3; two bounces come within r^2.
  const faults = [
    { distanceM: 10, kind: "across", ohm: 100 },
    { distanceM: 40, kind: "end", ohm: Infinity },
  ] as const;
  const sum = echoes({ ...LINE, faults }).reduce((total, { height }) => total + height, 0);
  expectNear(sum, 1 / 3, 0.04, "settled reflection");
});

test("three faults give a ghost for each pair of turns", () => {
  const faults = [5, 12, 30].map((distanceM) => ({ distanceM, kind: "series" as const, ohm: 20 }));
  expect(echoes({ ...LINE, faults }).filter(({ ghost }) => ghost)).toHaveLength(5);
});

test("faults at one place or behind the end are refused", () => {
  const end = { distanceM: 10, kind: "end", ohm: 0 } as const;
  const joint = { distanceM: 20, kind: "series", ohm: 5 } as const;
  expect(() => echoes({ ...LINE, faults: [end, joint] })).toThrow(RangeError);
  expect(() => echoes({ ...LINE, faults: [joint, joint] })).toThrow(RangeError);
  expect(() => echoes({ ...LINE, faults: [{ ...joint, ohm: -1 }] })).toThrow(RangeError);
});

test("the trace steps half way up at the echo's time, in the rise time asked for", () => {
  const trace = echoTrace([{ delayNs: 100, height: 1, ghost: false }], { points: 2001, stepNs: 0.1, riseNs: 2 });
  expectNear(trace[1000], 0.5, 1e-9, "middle");
  const crossing = (level: number) => trace.findIndex((value) => value >= level) * 0.1;
  expectNear(crossing(0.9) - crossing(0.1), 2, 0.11, "rise");
  expect(trace[0]).toBe(0);
  expect(trace[2000]).toBe(1);
});

test("noise is the seed's alone", () => {
  const noisy = () =>
    echoTrace([], { points: 50, stepNs: 1, riseNs: 1 }, { sigma: 0.01, random: seededRandom("7".repeat(64), "trace") });
  expect(noisy()).toEqual(noisy());
  expect(Math.max(...noisy())).toBeGreaterThan(0);
});

test("a reading of the trace gives back each echo of a line with two faults and an open end", () => {
  const line: Line = {
    ...LINE,
    lossDbPer100M: 8,
    faults: [
      { distanceM: 12, kind: "series", ohm: 15 },
      { distanceM: 31, kind: "across", ohm: 200 },
      { distanceM: 55, kind: "end", ohm: Infinity },
    ],
  };
  const sent = echoes(line).filter(({ ghost }) => !ghost);
  const noise = { sigma: 0.005, random: seededRandom("4".repeat(64), "trace") };
  const trace = echoTrace(sent, { points: 1400, stepNs: 0.5, riseNs: 4 }, noise);
  const read = readEchoTrace(trace, { stepNs: 0.5, window: 16, edge: 10, leastHeight: 0.01 });
  expect(read).toHaveLength(3);
  read.forEach(({ delayNs, height }, n) => {
    expectNear(delayNs, sent[n].delayNs, 0.8, "time");
    expectNear(height, sent[n].height, 0.02, "height");
  });
  expect(read.map(({ height }) => Math.sign(height))).toEqual([1, -1, 1]);
});

test("a trace of noise holds no echo, and a window that does not fit is refused", () => {
  const noise = { sigma: 0.01, random: seededRandom("9".repeat(64), "trace") };
  const reading = { stepNs: 0.5, window: 10, edge: 8, leastHeight: 0.01 };
  expect(readEchoTrace(echoTrace([], { points: 4000, stepNs: 0.5, riseNs: 4 }, noise), reading)).toEqual([]);
  expect(() => readEchoTrace(new Float64Array(100), { ...reading, window: 1 })).toThrow(RangeError);
  expect(() => readEchoTrace(new Float64Array(100), { ...reading, edge: -1 })).toThrow(RangeError);
  expect(() => readEchoTrace(new Float64Array(30), reading)).toThrow(RangeError);
});
