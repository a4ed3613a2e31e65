import { expect, test } from "vitest";
import { circularDifference } from "@/lib/checks/circularDifference";
import { expectNear } from "@/tests/support/expectNear";

test.each([
  [1022.9, 0.1, -0.2],
  [0.1, 1022.9, 0.2],
  [500, 400, 100],
  [0, 0, 0],
  [511.5, 0, -511.5],
])("from %d to %d round a code", (a, b, expected) =>
  expectNear(circularDifference(a, b, 1023), expected, 1e-9, "difference"),
);

test("not a number stays so", () => expect(circularDifference(NaN, 1, 1023)).toBeNaN());
