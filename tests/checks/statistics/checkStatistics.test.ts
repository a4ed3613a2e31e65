import { describe, expect, test } from "vitest";
import { checkStatistics, type CountedCase } from "@/lib/checks/statistics/checkStatistics";
import { LEAST_SITTINGS } from "@/lib/checks/statistics/discrimination";
import { expectNear } from "@/tests/support/expectNear";

const marked = (over: Partial<CountedCase>): CountedCase => ({
  sittingId: "1",
  checkId: "reading",
  number: 1,
  met: true,
  seconds: 600,
  byClock: false,
  outside: [],
  ...over,
});

test("nothing is said of a check that nobody has sat", () => {
  expect(checkStatistics(["reading", "plan"], [marked({ checkId: "plan" })])[0]).toEqual({
    ...{ checkId: "reading", cases: 0, met: 0, bounds: null, minutes: null, byClock: 0 },
    ...{ fresh: { cases: 0, met: 0 }, errors: [], discrimination: "too few" },
  });
});

// Clopper & Pearson 1934; for 4 of 4 the lower bound is the fourth root of 0.025.
test("the rate is of first cases, fresh ones apart", () => {
  const cases = [1, 2, 3, 4].map((n) => marked({ sittingId: String(n) }));
  const [reading] = checkStatistics(["reading"], [...cases, marked({ number: 2, met: false, seconds: 9e9 })]);
  expect(reading).toMatchObject({ cases: 4, met: 4, fresh: { cases: 1, met: 0 }, discrimination: "only check" });
  expectNear(reading!.bounds!.lower, 0.025 ** 0.25, 1e-9, "lower bound");
  expect(reading!.bounds!.upper).toBe(1);
  expect(reading!.minutes).toEqual({ lower: 10, middle: 10, upper: 10 });
});

// Places 1, 2 and 3 of three sorted times: NIST/SEMATECH e-Handbook, 7.2.6.2.
test("time is from opening to hand-in, by the clock or not", () => {
  const cases = [300, 1200, 420].map((seconds, n) =>
    marked({ sittingId: String(n), seconds, byClock: seconds === 1200 }),
  );
  expect(checkStatistics(["reading"], cases)[0]).toMatchObject({
    minutes: { lower: 5, middle: 7, upper: 20 },
    byClock: 1,
  });
});

test("classes of error are counted by quantity, most frequent first", () => {
  const sign = { quantity: "Doppler", errorClass: "sign" };
  const none = { quantity: "Doppler", errorClass: null };
  const lag = { quantity: "Lag", errorClass: "sign" };
  const cases = [[sign, lag], [none], [sign], []].map((outside, n) => marked({ sittingId: String(n), outside }));
  expect(checkStatistics(["reading"], [...cases, marked({ number: 2, outside: [none, none] })])[0]!.errors).toEqual([
    { ...sign, cases: 2 },
    { ...none, cases: 1 },
    { ...lag, cases: 1 },
  ]);
});

describe("discrimination", () => {
  type Met = [reading: boolean, plan: boolean, search: boolean];
  const three = ["reading", "plan", "search"];
  const ALL: Met = [true, true, true];
  const NONE: Met = [false, false, false];
  const sittings = (count: number, metIn: (n: number) => Met) =>
    Array.from({ length: count }, (_, n) =>
      metIn(n).map((met, at) => marked({ sittingId: String(n), checkId: three[at], met })),
    ).flat();
  const of = (cases: CountedCase[], checkIds = three) => checkStatistics(checkIds, cases)[0]!.discrimination;

  // Worked by hand: met with shares 1, 1 and 1/2, not met with 1/2, 0 and 0, five times each. Means 5/6 and 1/6, variance 1/6,
  // p q = 1/4, so that r squared is (2/3)^2 * (1/4) / (1/6) = 2/3.
  test("is the correlation with the share of the other checks", () => {
    const six: Met[] = [ALL, ALL, [true, true, false], [false, false, true], NONE, NONE];
    expectNear(of(sittings(30, (n) => six[n % 6]!)) as number, Math.sqrt(2 / 3), 1e-15, "correlation");
  });

  test("is not told below the least number of sittings, nor where all are alike", () => {
    const half = (n: number) => (n % 2 === 0 ? ALL : NONE);
    expect(of(sittings(LEAST_SITTINGS - 1, half))).toBe("too few");
    expect(of(sittings(LEAST_SITTINGS, half))).toBe(1);
    expect(of(sittings(LEAST_SITTINGS, () => [true, true, false]))).toBe("alike");
    expect(of(sittings(LEAST_SITTINGS, (n) => [n % 2 === 0, true, false]))).toBe("alike");
    expect(of(sittings(LEAST_SITTINGS, half), ["reading"])).toBe("only check");
  });

  test("leaves out sittings in which no other check was marked, and fresh cases", () => {
    const alone = Array.from({ length: 50 }, (_, n) => marked({ sittingId: `alone ${n}` }));
    const cases = sittings(LEAST_SITTINGS - 1, (n) => [n % 2 === 0, true, n % 3 === 0]);
    const fresh = cases.map((one) => ({ ...one, number: 2, met: true }));
    expect(of([...cases, ...alone, ...fresh])).toBe("too few");
    const enough = sittings(LEAST_SITTINGS, (n) => [n % 2 === 0, n % 2 === 1, n % 2 === 1]);
    expect(of([...enough, ...alone, ...enough.map((one) => ({ ...one, number: 2, met: true }))])).toBe(-1);
  });
});
