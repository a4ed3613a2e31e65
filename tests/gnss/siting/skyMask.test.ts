import { describe, expect, test } from "vitest";
import { blockedShare, zoneShare } from "@/lib/gnss/siting/skyMask";
import { expectNear } from "@/tests/support/expectNear";

const round = (topDeg: number) => [{ fromDeg: 0, toDeg: 360, topDeg }];

describe("area of a zone", () => {
  // Archimedes, On the Sphere and Cylinder I: a zone's area goes with its height, so 30 deg halves a hemisphere.
  test("an even horizon at 30 deg hides half of a hemisphere", () => expectNear(zoneShare(30, 0), 0.5, 1e-15, "share"));
  // (sin 30 - sin 10)/(1 - sin 10) with sin 10 = 0.17365 of printed five-figure tables.
  test("above 10 deg it hides 39.49 %", () => expectNear(zoneShare(30, 10), 0.3949, 5e-5, "share"));
  test("what stays below the mask hides nothing, the zenith everything", () => {
    expect(zoneShare(10, 10)).toBe(0);
    expect(zoneShare(4, 10)).toBe(0);
    expectNear(zoneShare(90, 10), 1, 1e-15, "zenith");
  });
  // The same by adding up thin rings, whose area goes with the cosine of their elevation: a second way.
  test.each([15, 25, 40, 65])("up to %i deg it agrees with rings of 0.01 deg", (topDeg) => {
    const ring = (from: number, to: number) => {
      let sum = 0;
      const steps = Math.round((to - from) * 100);
      for (let n = 0; n < steps; n++) sum += Math.cos(((from + (n + 0.5) / 100) * Math.PI) / 180);
      return sum;
    };
    expectNear(zoneShare(topDeg, 10), ring(10, topDeg) / ring(10, 90), 1e-8, "share");
  });
});

describe("a horizon in pieces", () => {
  const horizon = [
    { fromDeg: 0, toDeg: 60, topDeg: 5 },
    { fromDeg: 60, toDeg: 150, topDeg: 30 },
    { fromDeg: 150, toDeg: 360, topDeg: 0 },
  ];
  test("a quarter of the way round at 30 deg hides a quarter of an even horizon's share", () =>
    expectNear(blockedShare(horizon, 10), zoneShare(30, 10) / 4, 1e-15, "share"));
  test("is shared out between quadrants by azimuth", () => {
    const quadrants = [0, 90, 180, 270].map((from) => blockedShare(horizon, 10, [from, from + 90]));
    expectNear(quadrants[0] / quadrants[1], 0.5, 1e-12, "30 deg of the wall in the first quadrant, 60 in the second");
    expect(quadrants.slice(2)).toEqual([0, 0]);
    expectNear(quadrants[0] + quadrants[1], blockedShare(horizon, 10), 1e-15, "sum");
  });
  test("an even horizon hides as much in any window as the window is wide", () =>
    expectNear(blockedShare(round(45), 0, [20, 56]), zoneShare(45, 0) / 10, 1e-15, "share"));
  test("hides more when any piece grows", () => {
    for (let topDeg = 11; topDeg < 90; topDeg++)
      expect(blockedShare(round(topDeg + 1), 10)).toBeGreaterThan(blockedShare(round(topDeg), 10));
  });
});

test.each([
  [{ fromDeg: 90, toDeg: 60, topDeg: 20 }],
  [{ fromDeg: 0, toDeg: 361, topDeg: 20 }],
  [{ fromDeg: 0, toDeg: 90, topDeg: 91 }],
  [{ fromDeg: 0, toDeg: 90, topDeg: NaN }],
])("%j is no piece of a horizon", (sector) => expect(() => blockedShare([sector], 10)).toThrow(RangeError));
