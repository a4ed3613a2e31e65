import { expect, test } from "vitest";
import { evenSkyBand } from "@/lib/gnss/timing/evenSkyBand";
import { evenSkyTimeErrorNs, heldPositionTimeError, type Direction } from "@/lib/gnss/timing/heldPosition";
import { expectNear } from "@/tests/support/expectNear";

// The sum over single satellites, geometry by another function: equal areas of the sphere have even sines of elevation.
test.each([
  [0, 90],
  [10, 90],
  [25, 60],
])("is the limit of many satellites between %s and %s degrees", (lowest, highest) => {
  const sine = (deg: number) => Math.sin((deg * Math.PI) / 180);
  const sky: Direction[] = Array.from({ length: 6000 }, (_, n) => ({
    azimuthDeg: (n * 137.50776405) % 360,
    elevationDeg: (Math.asin(sine(lowest) + ((n + 0.5) / 6000) * (sine(highest) - sine(lowest))) * 180) / Math.PI,
  }));
  const error = { eastM: 4, northM: -7, upM: 5 };
  const expected = heldPositionTimeError(error, sky);
  const band = evenSkyBand(error, lowest, highest);
  expectNear(band.meanNs, expected.meanNs, 0.02, "mean");
  expectNear(band.spreadNs, expected.spreadNs, 0.02, "spread");
});

test("agrees with the sky above a mask, and shows all of a height error overhead", () => {
  expectNear(evenSkyBand({ eastM: 3, northM: 3, upM: 5 }, 10, 90).meanNs, evenSkyTimeErrorNs(5, 10), 1e-9, "mean");
  // 3 m are 10.007 ns: c, SI.
  const overhead = evenSkyBand({ eastM: 3, northM: 0, upM: 3 }, 90, 90);
  expectNear(overhead.meanNs, 10.007, 1e-3, "mean overhead");
  expectNear(overhead.spreadNs, 0, 1e-6, "spread overhead");
});

test.each([
  [50, 40],
  [-1, 40],
  [0, 91],
  [NaN, 90],
])("refuses a sky from %s to %s degrees", (lowest, highest) =>
  expect(() => evenSkyBand({ eastM: 0, northM: 0, upM: 1 }, lowest, highest)).toThrow(RangeError),
);
