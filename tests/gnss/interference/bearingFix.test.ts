import { describe, expect, test } from "vitest";
import {
  bearingDegOf,
  bearingOffDeg,
  ellipseAreaM2,
  errorEllipse,
  fixOfBearings,
  reachInEllipse,
  sumOfSquares,
  type BearingLine,
} from "@/lib/gnss/interference/bearingFix";
import { expectNear } from "@/tests/support/expectNear";

const at = (eastM: number, northM: number) => ({ eastM, northM });
const DEGREE = Math.PI / 180;

test.each([
  [at(0, 10), 0],
  [at(10, 10), 45],
  [at(10, 0), 90],
  [at(-10, -10), 225],
  [at(-10, 0), 270],
])("bearing to %j", (to, expected) => expectNear(bearingDegOf(at(0, 0), to), expected, 1e-9, "bearing, deg"));

test("a miss goes the short way round north", () => {
  const line = { ...at(0, 0), bearingDeg: 359, sigmaDeg: 2 };
  expectNear(bearingOffDeg(line, at(Math.tan(3 * DEGREE), 1)), -4, 1e-9, "miss, deg");
});

describe("two bearings that cross at right angles", () => {
  // By hand: from 500 m and 300 m off, each bearing holds the place to its distance times its spread in rad.
  const lines: BearingLine[] = [
    { ...at(0, 500), bearingDeg: 90, sigmaDeg: 3 }, // from the west, 800 m off
    { ...at(800, 100), bearingDeg: 0, sigmaDeg: 4 }, // from the south, 400 m off
  ];
  const fix = fixOfBearings(lines)!;
  test("place and covariance", () => {
    expectNear(fix.eastM, 800, 1e-6, "east, m");
    expectNear(fix.northM, 500, 1e-6, "north, m");
    expectNear(Math.sqrt(fix.covariance.northNorth), 800 * 3 * DEGREE, 1e-6, "north, m");
    expectNear(Math.sqrt(fix.covariance.eastEast), 400 * 4 * DEGREE, 1e-6, "east, m");
    expectNear(fix.covariance.eastNorth, 0, 1e-6, "covariance, m2");
    expectNear(fix.sumOfSquares, 0, 1e-12, "sum of squares");
  });
  // Chi-square of two degrees exceeds 5.991 with 5 % (Abramowitz & Stegun, table 26.8); its root is 2.448.
  test("95 % ellipse", () => {
    const ellipse = errorEllipse(fix, 0.95);
    expectNear(ellipse.semiMajorM, 2.44775 * 800 * 3 * DEGREE, 1e-3, "long half axis, m");
    expectNear(ellipse.semiMinorM, 2.44775 * 400 * 4 * DEGREE, 1e-3, "short half axis, m");
    expectNear(ellipse.azimuthDeg % 180, 0, 1e-6, "direction, deg");
    expectNear(ellipseAreaM2(ellipse), Math.PI * ellipse.semiMajorM * ellipse.semiMinorM, 1e-6, "area, m2");
  });
});

describe("many bearings", () => {
  const lines: BearingLine[] = [
    { ...at(100, 100), bearingDeg: 43, sigmaDeg: 3 },
    { ...at(900, 150), bearingDeg: 330, sigmaDeg: 2 },
    { ...at(1200, 800), bearingDeg: 261, sigmaDeg: 5 },
    { ...at(300, 1100), bearingDeg: 142, sigmaDeg: 4 },
    { ...at(50, 600), bearingDeg: 86, sigmaDeg: 3 },
  ];
  const fix = fixOfBearings(lines)!;

  // A second way: look at every place about it.
  test("no other place has a lesser sum of squares", () => {
    for (let east = -50; east <= 50; east += 2)
      for (let north = -50; north <= 50; north += 2) {
        const other = at(fix.eastM + east, fix.northM + north);
        expect(sumOfSquares(lines, other)).toBeGreaterThanOrEqual(fix.sumOfSquares - 1e-9);
      }
  });

  // The ellipse is that of the straightened problem; bearings bend it by a few per cent at these distances.
  test("on the edge of the 95 % ellipse the sum is 5.99 higher", () => {
    const { semiMajorM, semiMinorM, azimuthDeg } = errorEllipse(fix, 0.95);
    for (const [length, turned] of [
      [semiMajorM, azimuthDeg],
      [semiMinorM, azimuthDeg + 90],
      [semiMajorM, azimuthDeg + 180],
      [semiMinorM, azimuthDeg + 270],
    ]) {
      const angle = turned * DEGREE;
      const edge = at(fix.eastM + length * Math.sin(angle), fix.northM + length * Math.cos(angle));
      expectNear(sumOfSquares(lines, edge) - fix.sumOfSquares, 5.991, 0.5, "rise");
      expectNear(reachInEllipse(errorEllipse(fix, 0.95), edge), 1, 1e-9, "reach");
    }
  });
});

test("lines that say the same have no place", () => {
  const one = { ...at(0, 0), bearingDeg: 10, sigmaDeg: 3 };
  expect(fixOfBearings([one])).toBeNull();
  expect(fixOfBearings([one, { ...one, sigmaDeg: 4 }])).toBeNull();
  expect(fixOfBearings([])).toBeNull();
});
