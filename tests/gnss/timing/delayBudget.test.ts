import { expect, test } from "vitest";
import {
  delayBudget,
  delayLeftNs,
  entryValueNs,
  uncertaintyOfLimit,
  type DelayPart,
} from "@/lib/gnss/timing/delayBudget";
import {
  evenSkyTimeErrorNs,
  heldPositionTimeError,
  largestTimeErrorNs,
  type Direction,
} from "@/lib/gnss/timing/heldPosition";
import { expectNear } from "@/tests/support/expectNear";

const part = (ns: number, uncertaintyNs: number, sharedCause: string | null = null): DelayPart => ({
  ns,
  uncertaintyNs,
  sharedCause,
});

// JCGM 100:2008, 5.1.2 and 5.2.2: squares for independent parts, plain sum for a shared cause.
test("delays add, uncertainties add as squares", () => {
  const { totalNs, uncertaintyNs, expandedNs } = delayBudget([part(151.6, 3), part(40, 4), part(-12, 12)]);
  expectNear(totalNs, 179.6, 1e-12, "total");
  expectNear(uncertaintyNs, 13, 1e-12, "uncertainty");
  expectNear(expandedNs, 26, 1e-12, "expanded");
});

test("what shares a cause adds up in full, and against a part of the other sign cancels", () => {
  expectNear(delayBudget([part(100, 2, "VF"), part(50, 1, "VF"), part(9, 4)]).uncertaintyNs, 5, 1e-12, "same sign");
  expectNear(delayBudget([part(100, 2, "VF"), part(-50, 1, "VF")]).uncertaintyNs, 1, 1e-12, "other sign");
  expect(delayBudget([])).toEqual({ totalNs: 0, uncertaintyNs: 0, expandedNs: 0 });
  expect(() => delayBudget([part(1, -1)])).toThrow(RangeError);
});

// JCGM 100, 4.3.7: rectangular law.
test("a limit becomes a standard uncertainty", () => expectNear(uncertaintyOfLimit(6), 3.4641, 1e-4, "uncertainty"));

// Common practice, no source: with the wrong sign the error doubles.
test("the wrong sign doubles what the right one takes away", () => {
  for (const sign of ["delay-is-positive", "delay-is-negative"] as const) {
    expect(delayLeftNs(98, entryValueNs(98, sign), sign)).toBe(0);
    expect(delayLeftNs(98, -entryValueNs(98, sign), sign)).toBe(196);
    expect(delayLeftNs(98, 0, sign)).toBe(98);
  }
});

const overhead: Direction[] = [{ azimuthDeg: 0, elevationDeg: 90 }];
const ring: Direction[] = [0, 90, 180, 270].map((azimuthDeg) => ({ azimuthDeg, elevationDeg: 30 }));

// Chadsey, Precise Time and Time Interval meeting 1995, abstract: 3 m can exceed 10 ns, below
// 1 ns takes 0.2 m.
test("3 m up are 10 ns overhead, 0.2 m stay below 1 ns", () => {
  const up = (upM: number) => ({ eastM: 0, northM: 0, upM });
  expectNear(heldPositionTimeError(up(3), overhead).meanNs, 10.007, 1e-3, "overhead");
  expect(largestTimeErrorNs(up(3))).toBeGreaterThan(10);
  expect(largestTimeErrorNs({ eastM: 0.1, northM: 0.1, upM: 0.14 })).toBeLessThan(1);
});

test("satellites all round let a horizontal error spread and not shift; half of a height error stays at 30 degrees", () => {
  const sideways = heldPositionTimeError({ eastM: 3, northM: 0, upM: 0 }, ring);
  expectNear(sideways.meanNs, 0, 1e-12, "mean");
  expectNear(sideways.spreadNs, (3 / 0.299792458) * Math.cos(Math.PI / 6) * Math.SQRT1_2, 1e-9, "spread");
  expectNear(heldPositionTimeError({ eastM: 0, northM: 0, upM: 3 }, ring).meanNs, 5.0035, 1e-4, "height");
  expectNear(heldPositionTimeError({ eastM: 1, northM: 0, upM: 0 }, [ring[1]]).meanNs, 2.8888, 1e-4, "one in the east");
  expect(() => heldPositionTimeError({ eastM: 0, northM: 0, upM: 3 }, [])).toThrow(RangeError);
});

test("the even sky is the limit of many satellites", () => {
  const many: Direction[] = [];
  for (let n = 0; n < 4000; n++) {
    // equal areas of the sphere above 10 degrees: the sine of the elevation is even
    const low = Math.sin(Math.PI / 18);
    const sine = low + ((n + 0.5) / 4000) * (1 - low);
    many.push({ azimuthDeg: (n * 137.50776) % 360, elevationDeg: (Math.asin(sine) * 180) / Math.PI });
  }
  const { meanNs } = heldPositionTimeError({ eastM: 2, northM: 2, upM: 5 }, many);
  expectNear(evenSkyTimeErrorNs(5, 10), meanNs, 0.02, "time error");
});
