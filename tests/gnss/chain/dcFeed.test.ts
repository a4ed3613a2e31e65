import { expect, test } from "vitest";
import { dcFeed, loopResistanceOhm, type DcPart } from "@/lib/gnss/chain/dcFeed";
import { expectNear } from "@/tests/support/expectNear";

const amplifier: DcPart = { currentMa: 30, minimumV: 3, resistanceOhm: 0, passesDc: true };
const cable: DcPart = { currentMa: 0, minimumV: 0, resistanceOhm: 4, passesDc: true };
const arrester: DcPart = { currentMa: 0, minimumV: 0, resistanceOhm: 0.5, passesDc: true };
const block: DcPart = { currentMa: 0, minimumV: 0, resistanceOhm: 0, passesDc: false };
const SUPPLY = { volts: 5, limitMa: 100, sourceOhm: 10 };

// Ohm's law by hand: 30 mA through 10 + 0.5 + 4 ohm drops 0.435 V.
test("one amplifier at the top of a cable", () => {
  const feed = dcFeed([amplifier, cable, arrester], SUPPLY);
  expect(feed.totalMa).toBe(30);
  expectNear(feed.parts[2].volts!, 4.7, 1e-12, "at the receiver");
  expectNear(feed.parts[0].volts!, 4.565, 1e-12, "at the amplifier");
  expect(feed.allFed && feed.withinLimit).toBe(true);
});

test("two amplifiers share the cable between them", () => {
  const feed = dcFeed([amplifier, cable, { ...amplifier, currentMa: 20 }, cable], SUPPLY);
  expect(feed.totalMa).toBe(50);
  expectNear(feed.parts[2].volts!, 5 - 0.05 * 14, 1e-12, "lower amplifier");
  expectNear(feed.parts[0].volts!, 5 - 0.05 * 14 - 0.03 * 4, 1e-12, "upper amplifier");
  expect(feed.parts.map(({ currentMa }) => currentMa)).toEqual([30, 30, 50, 50]);
});

test("a part that blocks direct current leaves all beyond it without", () => {
  const feed = dcFeed([amplifier, block, cable], SUPPLY);
  expect(feed.totalMa).toBe(0);
  expect(feed.parts[0]).toEqual({ currentMa: 0, volts: null, fed: false });
  expect(feed.allFed).toBe(false);
  expect(feed.parts[2].volts).toBe(5);
});

test("too low a voltage and too much current are said", () => {
  const thirsty = { ...amplifier, currentMa: 120 };
  const feed = dcFeed([thirsty, cable], SUPPLY);
  expect(feed.withinLimit).toBe(false);
  expect(dcFeed([amplifier, { ...cable, resistanceOhm: 60 }], SUPPLY).allFed).toBe(false);
  expect(() => dcFeed([{ ...cable, resistanceOhm: -1 }], SUPPLY)).toThrow(RangeError);
  expect(dcFeed([], SUPPLY)).toEqual({ parts: [], totalMa: 0, withinLimit: true, allFed: true });
});

test("a cable's loop resistance counts both conductors", () =>
  expectNear(loopResistanceOhm(50, 4.5, 5.5), 0.5, 1e-12, "loop"));
