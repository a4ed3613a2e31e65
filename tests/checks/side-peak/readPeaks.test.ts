import { describe, expect, test } from "vitest";
import { biasM, levelDb, readPeaks } from "@/lib/checks/side-peak/readPeaks";
import { reflectedShape } from "@/lib/checks/side-peak/reflectedShape";
import { boc } from "@/lib/gnss/spectra/modulation";
import { correlationShape } from "@/lib/gnss/tracking/correlationShape";
import { expectNear } from "@/tests/support/expectNear";

const STEP = 0.005;
const traceOf = (at: (delayChips: number) => number) =>
  Array.from({ length: 721 }, (_, n) => Math.abs(at((n - 360) * STEP)));
const plain = correlationShape(boc(1, 1), null);

describe("an undisturbed BOC(1,1)", () => {
  // Side peaks half a chip off and half as high: 146.5 m and 6.02 dB; common practice, no source.
  const peaks = readPeaks(traceOf(plain), 1000 - 360 * STEP, STEP);
  test("has its main peak where it was put", () => expectNear(peaks.main.lagChips, 1000, 1e-9, "main"));
  test.each([
    ["earlier", -146.53],
    ["later", 146.53],
  ] as const)("%s side peak", (side, expected) => {
    expectNear(biasM(peaks, side), expected, 0.01, "bias, m");
    expectNear(levelDb(peaks, side), 6.0206, 1e-4, "level, dB");
  });
});

// In phase, 0.3 chip behind and 0.4 of the amplitude, without a filter, worked by hand from the straight lines of R (1 at 0,
// -0.5 at 0.5, 0 at 1): main 1 + 0.4 R(0.3) = 1.04; before it |R(0.5) + 0.4 R(0.8)| = 0.58.
test("a reflection changes the levels as the sum of two shapes", () => {
  const { at } = reflectedShape(plain, { ratio: 0.4, extraChips: 0.3, turns: 0 });
  const peaks = readPeaks(
    traceOf((delay) => at(delay)[0]),
    -360 * STEP,
    STEP,
  );
  expectNear(peaks.main.level, 1.04, 1e-9, "main");
  expectNear(peaks.earlier.level, 0.58, 1e-9, "before it");
  expectNear(levelDb(peaks, "earlier"), 5.0722, 1e-3, "before it, dB");
});

test("a quarter turn of the reflection stands in the imaginary part", () => {
  const [re, im] = reflectedShape(plain, { ratio: 0.4, extraChips: 0.3, turns: 0.25 }).at(0.3);
  expectNear(re, 0.1, 1e-12, "direct signal alone");
  expectNear(im, 0.4, 1e-12, "reflection at its own top");
});

describe("peaks that are not plain are not asked about", () => {
  const filtered = correlationShape(boc(1, 1), 8e6);
  test("three tops are", () =>
    expect(reflectedShape(filtered, { ratio: 0, extraChips: 0.2, turns: 0 }).peaksAt(50)).not.toBeNull());
  test("a reflection as strong as the signal, half a chip behind, is not", () =>
    expect(reflectedShape(filtered, { ratio: 1, extraChips: 0.5, turns: 0.5 }).peaksAt(50)).toBeNull());
  test("nor is plain code without side peaks", () =>
    expect(
      reflectedShape((delay) => Math.max(0, 1 - Math.abs(delay)), { ratio: 0, extraChips: 0, turns: 0 }).peaksAt(50),
    ).toBeNull());
});
