import { expect, test } from "vitest";
import { mixProducts } from "@/lib/gnss/interference/mixProducts";
import {
  distanceOfPowerM,
  milliwattsToDbm,
  pathLossDb,
  receivedDbm,
  type InterferencePath,
} from "@/lib/gnss/interference/standOff";
import { freeSpaceLossDb } from "@/lib/gnss/linkBudget";
import { expectNear } from "@/tests/support/expectNear";

const PATH: InterferencePath = { eirpDbm: 10, frequencyHz: 1575.42e6, exponent: 2, screenDb: 0, antennaGainDb: 0 };

// 10 mW at 1 km in free space: -86 dBm, 42 dB above -128.5 dBm; values from a second program.
test("10 mW at 1 km", () => {
  expectNear(milliwattsToDbm(10), 10, 1e-12, "EIRP");
  expectNear(receivedDbm(PATH, 1000), -86.4, 0.05, "power");
  expectNear(receivedDbm(PATH, 1000) + 128.5, 42, 0.2, "J/S");
});

test("with exponent 2 the loss is that of free space; each further unit adds 10 dB per tenfold distance", () => {
  for (const distanceM of [1, 30, 5000])
    expectNear(pathLossDb(PATH, distanceM), freeSpaceLossDb(distanceM, 1575.42e6), 1e-9, "free space");
  expectNear(pathLossDb({ ...PATH, exponent: 4 }, 1000) - pathLossDb(PATH, 1000), 60, 1e-9, "exponent 4");
  expectNear(pathLossDb({ ...PATH, screenDb: 17 }, 1000) - pathLossDb(PATH, 1000), 17, 1e-9, "screen");
});

test("the distance of a power is where that power is received", () => {
  for (const exponent of [2, 3.3]) {
    const path = { ...PATH, exponent, screenDb: 8, antennaGainDb: -5 };
    const distanceM = distanceOfPowerM(path, -95);
    expectNear(receivedDbm(path, distanceM), -95, 1e-9, "power there");
  }
  expect(distanceOfPowerM({ ...PATH, eirpDbm: -80 }, -95)).toBe(1);
  expect(() => pathLossDb(PATH, 0.5)).toThrow(RangeError);
  expect(() => distanceOfPowerM({ ...PATH, exponent: 0 }, -95)).toThrow(RangeError);
});

const L1 = { lowHz: 1574.4e6, highHz: 1576.44e6 };

// Harmonics of VHF channels that aircraft guidance asks about: 121.150 x 13, 131.250 x 12, 157.55 x 10. Arithmetic.
test.each([
  [121.15e6, 13, 1574.95e6],
  [131.25e6, 12, 1575e6],
  [157.55e6, 10, 1575.5e6],
])("%s Hz times %s falls on L1", (frequencyHz, times, product) => {
  const hits = mixProducts([frequencyHz], 15, L1);
  expect(hits).toHaveLength(1);
  expect(hits[0].multipliers).toEqual([times]);
  expectNear(hits[0].frequencyHz, product, 1, "product");
  expectNear(hits[0].offsetHz, product - 1575.42e6, 1, "offset");
});

test("mixes of two and three, lowest order first, each once", () => {
  const hits = mixProducts([800e6, 24.58e6, 1200e6, 12.29e6], 3, L1);
  const written = hits.map(({ multipliers }) => multipliers.join(" "));
  expect(written).toContain("2 -1 0 0");
  expect(new Set(written).size).toBe(written.length);
  expect(hits.every(({ order }, n) => n === 0 || order >= hits[n - 1].order)).toBe(true);
  expect(mixProducts([700e6, 100e6, 775.42e6], 3, L1).map(({ multipliers }) => multipliers)).toEqual([[1, 1, 1]]);
});

test("no frequency, a band that none reaches, and orders beyond 15", () => {
  expect(mixProducts([], 5, L1)).toEqual([]);
  expect(mixProducts([10e6], 3, L1)).toEqual([]);
  expect(() => mixProducts([100e6], 16, L1)).toThrow(RangeError);
  expect(() => mixProducts([0], 5, L1)).toThrow(RangeError);
});
