import { expect, test } from "vitest";
import { changesAt, meanChangeDb } from "@/lib/gnss/sky/cn0Change";
import type { Pass, ReceiverLog } from "@/lib/gnss/sky/receiverLog";

// By hand: readings 10 s apart, so a minute is six of them and the gap two; the step stands at reading 20.
const stepped = (prn: number, before: number, after: number, first = 0): Pass => ({
  prn,
  first,
  cn0DbHz: Array.from({ length: 40 - first }, (_, at) => (first + at < 20 ? before : after)),
  azimuthDeg: [0, 0],
  elevationDeg: [45, 45],
});
const log = (...passes: Pass[]): ReceiverLog => ({
  startUnixMs: 0,
  intervalS: 10,
  readings: 40,
  trackEvery: 40,
  passes,
});

test("means of a minute on either side, satellite by satellite", () => {
  const both = log(stepped(3, 45, 40), stepped(7, 50, 51));
  expect(changesAt(both, 20)).toEqual([
    { prn: 3, beforeDbHz: 45, afterDbHz: 40 },
    { prn: 7, beforeDbHz: 50, afterDbHz: 51 },
  ]);
  expect(meanChangeDb(both, 20)).toBe(-2);
});

test("a cursor two readings beside the step finds the same, three beside it does not", () => {
  const one = log(stepped(3, 45, 39));
  expect([18, 22].map((at) => meanChangeDb(one, at))).toEqual([-6, -6]);
  expect(meanChangeDb(one, 17)).toBe(-5);
});

test("a satellite that is not tracked through both minutes does not count", () => {
  const lost = {
    ...stepped(9, 45, 40),
    cn0DbHz: stepped(9, 45, 40).cn0DbHz.map((cn0, at) => (at === 25 ? null : cn0)),
  };
  expect(changesAt(log(lost), 20)).toEqual([]);
  expect(changesAt(log(stepped(4, 45, 40, 14)), 20)).toEqual([]);
  expect(meanChangeDb(log(), 20)).toBeNaN();
});
