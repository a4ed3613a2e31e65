import { expect, test } from "vitest";
import { expectNear } from "@/tests/support/expectNear";
import { bandMeans, directionAt, turnDeg, utcOf, wrapDeg, type Pass } from "@/lib/gnss/sky/receiverLog";

// By hand: one satellite climbs from 8 to 28 deg in twenty readings and goes through north from 350 to 10 deg.
const pass: Pass = {
  prn: 7,
  first: 10,
  cn0DbHz: Array.from({ length: 21 }, (_, n) => (n === 3 ? null : 30 + n)),
  azimuthDeg: [350, 0, 10],
  elevationDeg: [8, 18, 28],
};
const log = {
  startUnixMs: Date.UTC(2026, 2, 14, 23, 59, 0),
  intervalS: 10,
  readings: 40,
  trackEvery: 10,
  passes: [pass],
};

test("directions lie evenly between those given, through north as well", () => {
  expect(directionAt(pass, 10, 10)).toEqual({ azimuthDeg: 350, elevationDeg: 8 });
  expect(directionAt(pass, 10, 15)).toEqual({ azimuthDeg: 355, elevationDeg: 13 });
  expect(directionAt(pass, 10, 25)).toEqual({ azimuthDeg: 5, elevationDeg: 23 });
  expect(directionAt(pass, 10, 30)).toEqual({ azimuthDeg: 10, elevationDeg: 28 });
});

test.each([
  [350, 10, 20],
  [10, 350, -20],
  [0, 180, -180],
  [90, 91, 1],
])("from %i to %i deg", (from, to, turn) => expect(turnDeg(from, to)).toBe(turn));

test("angles go round", () => expect([-10, 370, 360, 0].map(wrapDeg)).toEqual([350, 10, 0, 0]));

test("means by elevation leave out what is not tracked and what is told", () => {
  // 8 and 9 deg: readings 0 and 1; 10 to 19 deg: 2 to 11 without 3; 20 to 28 deg: 12 to 20.
  const means = bandMeans(log, null);
  expect(means.map(({ readings }) => readings)).toEqual([2, 9, 9, 0, 0, 0]);
  expect(means[0].meanDbHz).toBe(30.5);
  expectNear(means[1].meanDbHz, (32 + 34 + 35 + 36 + 37 + 38 + 39 + 40 + 41) / 9, 1e-12, "mean, dB-Hz");
  expect(means[3].meanDbHz).toBeNaN();
  expect(bandMeans(log, [10, 21])[1].readings).toBe(0);
  expect(bandMeans(log, [10, 10])[0]).toMatchObject({ readings: 1, meanDbHz: 31 });
});

test("time of a reading goes over midnight", () => {
  expect(utcOf(log, 0)).toBe("23:59:00");
  expect(utcOf(log, 7)).toBe("00:00:10");
});
