import { describe, expect, test } from "vitest";
import { cableDelayNs, delayNsPerM, faultDistance, velocityFactorOfEcho } from "@/lib/gnss/chain/cableDelay";
import { cableLossDb, fitCableLoss } from "@/lib/gnss/chain/cableLoss";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

// C01: definition.
test.each(formulaCases("C01"))("$name", ({ given, expected }) => {
  expectNearRelative(delayNsPerM(given.VF), expected.ns_per_m, 2e-5, "per metre");
  expectNearRelative(cableDelayNs(given.len_m, given.VF), expected.ns, 2e-5, "run");
});

// 25 m of foam cable of 0.85 left uncorrected are 98 ns: common practice, no source.
test("25 m of foam cable", () => expectNear(cableDelayNs(25, 0.85), 98, 0.2, "delay"));

describe("loss", () => {
  // A cable manufacturer's data sheet, foam polyethylene of 10 mm, dB per 100 m; from memory.
  const printed = [
    [150, 5.0],
    [450, 8.9],
    [900, 12.8],
    [1500, 16.8],
    [2000, 19.6],
    [2500, 22.2],
  ].map(([mhz, dbPer100M]) => ({ frequencyHz: mhz * 1e6, dbPer100M }));

  test("two points of the data sheet give the others", () => {
    const cable = fitCableLoss([printed[1], printed[5]]);
    for (const { frequencyHz, dbPer100M } of printed)
      expectNear(cableLossDb(cable, 100, frequencyHz), dbPer100M, 0.15, `loss at ${frequencyHz} Hz`);
  });

  test("all points fit better than to a tenth of a dB", () => {
    const cable = fitCableLoss(printed);
    for (const { frequencyHz, dbPer100M } of printed)
      expectNear(cableLossDb(cable, 100, frequencyHz), dbPer100M, 0.1, `loss at ${frequencyHz} Hz`);
    expect(cable.skinDb).toBeGreaterThan(cable.dielectricDb);
  });

  test("one point grows with the root of the frequency, and twice the run loses twice", () => {
    const cable = fitCableLoss([{ frequencyHz: 1e9, dbPer100M: 12 }]);
    expect(cable).toEqual({ skinDb: 12, dielectricDb: 0 });
    expectNear(cableLossDb(cable, 200, 4e9), 48, 1e-9, "loss");
    expect(fitCableLoss([printed[0], printed[0]]).dielectricDb).toBe(0);
  });

  // Copper's 0.393 % per K, IEC 60028, enters with the root.
  test("heat adds 0.2 % per K", () => {
    const cable = fitCableLoss([{ frequencyHz: 1e9, dbPer100M: 10 }]);
    expectNearRelative(cableLossDb(cable, 100, 1e9, 60), 10 * Math.sqrt(1 + 0.00393 * 40), 5e-3, "loss at 60 C");
  });

  test("a sheet without points or with zeros is refused", () => {
    expect(() => fitCableLoss([])).toThrow(RangeError);
    expect(() => fitCableLoss([{ frequencyHz: 0, dbPer100M: 1 }])).toThrow(RangeError);
  });
});

describe("echo", () => {
  // d = VF c t/2: definition.
  test("half of the way there and back", () => {
    expectNear(faultDistance(200, 0.66).distanceM, 0.66 * 299_792_458 * 100e-9, 1e-9, "distance");
    expectNear(faultDistance(2 * cableDelayNs(37.4, 0.82), 0.82).distanceM, 37.4, 1e-9, "there and back");
  });

  test("uncertainties of time and velocity factor add as squares", () => {
    const { distanceM, uncertaintyM } = faultDistance(400, 0.8, { echoNs: 3, velocityFactor: 0.012 });
    expectNear(uncertaintyM / distanceM, Math.hypot(3 / 400, 0.012 / 0.8), 1e-12, "relative uncertainty");
  });

  test("a known length gives the velocity factor; faster than light is refused", () => {
    expectNear(velocityFactorOfEcho(30, 2 * cableDelayNs(30, 0.78)), 0.78, 1e-12, "velocity factor");
    expect(() => velocityFactorOfEcho(100, 400)).toThrow(RangeError);
    for (const wrong of [0, 1.01, NaN]) expect(() => cableDelayNs(1, wrong)).toThrow(RangeError);
  });
});
