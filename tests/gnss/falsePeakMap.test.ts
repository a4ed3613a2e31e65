import { expect, test } from "vitest";
import { falsePeaks } from "@/lib/gnss/falseLock";
import { falsePeakMap } from "@/lib/gnss/falsePeakMap";
import { expectNear } from "@/tests/support/expectNear";

const question = {
  parentPrn: 5,
  victimPrn: 4,
  parentDopplerHz: 1730,
  parentCn0DbHz: 52,
  coherentMs: 10,
  sums: 10,
  dopplerHalfWidthHz: 9000,
};

// The pair's highest peak is 21.0806 dB below the parent's own, as computed by a second program; a mean cell is 1 + C/N0 T.
test("the highest cell is the highest false peak, with noise 1", () => {
  const { dopplersHz, lagsChips, power } = falsePeakMap(question);
  const [highest] = falsePeaks(question);
  const at = power.indexOf(Math.max(...power));
  expect(dopplersHz[Math.floor(at / lagsChips.length)]).toBe(highest.dopplerHz);
  expect(lagsChips[at % lagsChips.length]).toBe(highest.lagChips);
  expectNear(power[at], 1 + 10 ** ((52 - 21.0806) / 10) * 0.01, 2e-3, "power");
});

test("rows stand whole kHz from the parent, inside the window, lowest first", () => {
  const { dopplersHz, power } = falsePeakMap(question);
  expect([...dopplersHz]).toEqual(Array.from({ length: 18 }, (_, n) => -8270 + 1000 * n));
  expect(power.length).toBe(18 * 1023);
  expect(falsePeakMap({ ...question, coherentMs: 1 }).dopplersHz[1]).toBe(-8270); // half kHz as well: -8770 comes first
});

// Gold's bound: at equal Doppler no cell holds more than 65 of 1023 chips (Gold, 1967).
test("at equal Doppler the cells take three values of the codes", () => {
  const { power } = falsePeakMap({ ...question, parentDopplerHz: 0, dopplerHalfWidthHz: 500 });
  const chips = [...power].map((value) => Math.round(1023 * Math.sqrt((value - 1) / (10 ** 5.2 * 0.01))));
  expect(new Set(chips)).toEqual(new Set([1, 63, 65]));
});
