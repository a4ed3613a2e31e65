import { expect, test } from "vitest";
import { findSteps } from "@/lib/checks/receiver-log/findSteps";
import { seededRandom } from "@/lib/numeric/random";
import { seedOf } from "../planOf";

const level = (at: number) => (at < 40 ? 30 : at < 90 ? 26 : 31);

test("steps of a series without noise stand where they are and are as large as they are", () =>
  expect(
    findSteps(
      Array.from({ length: 120 }, (_, at) => level(at)),
      2,
    ),
  ).toEqual([
    { at: 40, size: -4 },
    { at: 90, size: 5 },
  ]));

test("noise of a tenth of the step moves none of them", () => {
  const random = seededRandom(seedOf(4), "steps");
  for (let n = 0; n < 200; n++) {
    const noisy = Array.from({ length: 120 }, (_, at) => level(at) + 0.4 * random.gaussian());
    expect(findSteps(noisy, 2).map(({ at }) => at)).toEqual([40, 90]);
  }
});

test.each([[[]], [[1, 2, 3]], [Array.from({ length: 200 }, () => 7)]])("nothing steps in %j", (values) =>
  expect(findSteps(values, 1)).toEqual([]),
);
