import { expect, test } from "vitest";
import { sittingRates, type CheckRates } from "@/lib/checks/release-check/sittingRates";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";
import { seedOf } from "../planOf";

const checks = (read: number, guess: number, ids = "abcde"): CheckRates[] =>
  [...ids].map((id) => ({ id, read, guess }));
const all = (ids: string) => ({ all: [...ids], some: null });

test("five checks at 97 %: 86 % of careful people meet them all at once, nearly all with a fresh case each", () => {
  const rates = sittingRates(all("abcde"), 1, checks(0.97, 0));
  expectNear(rates.careful, 0.8587340257, 1e-10, "0.97^5");
  expectNear(rates.carefulWithFresh, 0.9955080927, 1e-9, "(1 - 0.03^2)^5"); // 0.9991^5
});

test.each([
  ["one check guessed at 0.1 %, no fresh case", 0.001, "a", 0, true],
  ["the same with a fresh case", 0.001, "a", 1, false],
  ["two checks at 1 %, one fresh case: 0.04 %", 0.01, "ab", 1, true],
])("%s", (_what, guess, ids, fresh, within) =>
  expect(sittingRates(all(ids), fresh, checks(1, guess, ids)).guessedWithin).toBe(within),
);

test("at least two of three, and one of them needed besides", () => {
  // Of three at 1/2: exactly 2 or 3 met, 4/8. With a needed: a met and one of b, c: 1/2 * 3/4.
  const half = checks(0.5, 0, "abc");
  expectNear(
    sittingRates({ all: [], some: { of: ["a", "b", "c"], count: 2 } }, 0, half).careful,
    0.5,
    1e-15,
    "two of three",
  );
  expectNear(
    sittingRates({ all: ["a"], some: { of: ["a", "b", "c"], count: 2 } }, 0, half).careful,
    0.375,
    1e-15,
    "with a",
  );
});

test("a check that people judge is taken as met, and told", () => {
  const rates = sittingRates(all("ab"), 0, [
    { id: "a", read: 0.9, guess: 0.01 },
    { id: "b", read: null, guess: null },
  ]);
  expect(rates).toMatchObject({ careful: 0.9, guessed: 0.01, guessedWithin: false, taken: ["b"] });
});

test("agrees with sittings drawn one by one", () => {
  const required = { all: ["a", "b"], some: { of: ["b", "c", "d", "e"], count: 3 } };
  const rates: CheckRates[] = [0.9, 0.8, 0.6, 0.7, 0.5].map((read, n) => ({ id: "abcde"[n]!, read, guess: 0 }));
  const random = seededRandom(seedOf(5), "sittings");
  const sittings = 20_000;
  let met = 0;
  for (let n = 0; n < sittings; n++) {
    const held = new Set(rates.filter(({ read }) => random.uniform() < read!).map(({ id }) => id));
    const some = required.some.of.filter((id) => held.has(id)).length;
    if (required.all.every((id) => held.has(id)) && some >= 3) met++;
  }
  expectNear(sittingRates(required, 0, rates).careful, met / sittings, 0.015, "four standard errors");
});
