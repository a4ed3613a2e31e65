import { describe, expect, test } from "vitest";
import { bandPower, edgesAtLevel } from "@/lib/gnss/interference/bandReading";
import { expectNear } from "@/tests/support/expectNear";

const offsetsHz = Float64Array.from({ length: 11 }, (_, n) => (n - 5) * 100);
const flat = { offsetsHz, densityPerHz: new Float64Array(11).fill(2), resolutionHz: 100, averaged: 1 };

describe("power between two offsets", () => {
  // By hand: a density of 2 per Hz over 300 Hz is 600, wherever the bins are cut; the bins reach 50 Hz beyond the outer ones.
  test.each([
    [-150, 150, 600],
    [-130, 170, 600],
    [10, 20, 20],
    [-1e6, 1e6, 2200],
    [700, 900, 0],
  ])("%d to %d Hz", (from, to, power) => expectNear(bandPower(flat, from, to), power, 1e-9, "power"));
});

describe("edges", () => {
  // By hand on straight sides: a roof of height 10 that falls by 2 a bin crosses 5 two and a half bins from its top.
  const roof = Float64Array.from({ length: 11 }, (_, n) => Math.max(0, 10 - 2 * Math.abs(n - 5)));
  test("between bins", () => {
    const { lowHz, highHz } = edgesAtLevel(offsetsHz, roof, 5);
    expectNear(lowHz, -250, 1e-9, "low edge, Hz");
    expectNear(highHz, 250, 1e-9, "high edge, Hz");
  });
  test("the outermost crossing counts, holes do not", () => {
    const holed = roof.map((value, n) => (n === 4 ? 0 : value));
    expectNear(edgesAtLevel(offsetsHz, holed, 5).lowHz, -250, 1e-9, "low edge, Hz");
  });
  test("an edge at the end of the band stays there", () =>
    expect(edgesAtLevel(offsetsHz, flat.densityPerHz, 1)).toEqual({ lowHz: -500, highHz: 500 }));
  test("what nothing reaches has none", () =>
    expect(() => edgesAtLevel(offsetsHz, roof, 11)).toThrow(/nothing reaches/));
});
