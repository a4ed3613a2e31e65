import { expect, test } from "vitest";
import { askedQuantities } from "@/lib/checks/askedQuantities";
import type { CheckPlan } from "@/lib/checks/kind";
import { correlatorReading } from "@/lib/checks/correlator-reading/correlatorReading";
import { planOf } from "./planOf";

const definitions = correlatorReading.quantities;
const withQuantities = (quantities: CheckPlan["quantities"]) =>
  askedQuantities(definitions, { ...planOf(correlatorReading), quantities });

test("a plan that names none asks all, in the kind's order", () =>
  expect([...withQuantities([]).keys()]).toEqual(definitions.map(({ id }) => id)));

test("a plan that names some asks those, in the kind's order", () => {
  const named = [
    { of: "lag", tolerance: null, critical: false },
    { of: "detection", tolerance: null, critical: true },
  ];
  expect([...withQuantities(named).keys()]).toEqual(["detection", "lag"]);
});

test("tolerance and critical mark of the release take the place of the kind's; units are converted", () => {
  const asked = withQuantities([
    { of: "lag", tolerance: { value: 0.3, unit: "chip" }, critical: true },
    { of: "peakRatio", tolerance: null, critical: false },
    { of: "noiseMean", tolerance: { value: 0.05, unit: "1" }, critical: false },
  ]);
  expect(asked.get("lag")).toMatchObject({ tolerance: 0.3, critical: true });
  expect(asked.get("peakRatio")).toMatchObject({ tolerance: 1, critical: false });
  expect(asked.get("noiseMean")).toMatchObject({ tolerance: 5 });
});

test.each([
  ["an unknown quantity", { of: "mood", tolerance: null, critical: false }],
  ["a tolerance out of range", { of: "lag", tolerance: { value: 5, unit: "chip" as const }, critical: false }],
  [
    "a tolerance that is not a number",
    { of: "lag", tolerance: { value: NaN, unit: "chip" as const }, critical: false },
  ],
  ["a tolerance in another dimension", { of: "lag", tolerance: { value: 0.2, unit: "Hz" as const }, critical: false }],
  ["a tolerance for a word", { of: "detection", tolerance: { value: 1, unit: "1" as const }, critical: true }],
])("refuses %s", (_what, named) => expect(() => withQuantities([named])).toThrow(/askedQuantities|convert/));
