import { expect, test } from "vitest";
import { caCode } from "@/lib/gnss/caCode";
import { chipsOf, levelsOf, registerRun, registerSequence } from "@/lib/gnss/shiftRegister";

test("a run from all ones is the sequence, and goes on as it began", () => {
  const sequence = registerSequence(0o2011);
  const run = registerRun(0o2011, 1023, 2000);
  expect(run.subarray(0, 1023)).toEqual(sequence);
  expect(run.subarray(1023)).toEqual(sequence.subarray(0, 977));
});

// 1 + x^2 + x^5 by hand: stages 1 to 5 hold 1 0 0 0 0, so 0 0 0 0 1 comes out; then each level is the sum of those two
// and five places before it, out[n + 5] = out[n + 3] + out[n].
test("a start puts its own content out first, highest stage first", () =>
  expect(registerRun(0o45, 0b00001, 10).join("")).toBe("0000101011"));

test.each([0, 32, -1, 1.5, NaN])("a register of five stages cannot start from %d", (start) =>
  expect(() => registerRun(0o45, start, 10)).toThrow(RangeError),
);

test("levels and chips are each other's inverse", () => expect(chipsOf(levelsOf(caCode(3)))).toEqual(caCode(3)));
