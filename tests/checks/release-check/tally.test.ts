import { describe, expect, test } from "vitest";
import { caseSeed } from "@/lib/checks/release-check/caseSeed";
import { judgeTally } from "@/lib/checks/release-check/judgeTally";
import { addTallies, emptyTally, type Tally } from "@/lib/checks/release-check/tally";
import { handInOf, tryCase } from "@/lib/checks/release-check/tryCase";
import { tryWholeCase } from "@/lib/checks/release-check/tryWholeCase";
import { seedOf } from "../planOf";
import { sampleKind, samplePlan, type Faults } from "./sampleKind";

const BASE = seedOf(3);
const trials = (faults: Faults, from: number, to: number): Tally => {
  let sum = emptyTally();
  for (let n = from; n < to; n++) sum = addTallies(sum, tryCase(sampleKind(faults), samplePlan, BASE, n));
  return sum;
};
const verdict = (tally: Tally, id: string) =>
  judgeTally(sampleKind(), samplePlan, tally).find((line) => line.id === id);

describe("seeds", () => {
  test("are 64 figures, each of its own, the same every time", () => {
    const drawn = Array.from({ length: 200 }, (_, n) => [caseSeed(BASE, n, "case"), caseSeed(BASE, n, "whole")]).flat();
    expect(new Set(drawn).size).toBe(400);
    expect(drawn.every((seed) => /^[0-9a-f]{64}$/.test(seed))).toBe(true);
    expect(caseSeed(BASE, 7, "case")).toBe(drawn[14]);
    expect(caseSeed(seedOf(4), 7, "case")).not.toBe(drawn[14]);
  });
});

describe("parts add up to the whole", () => {
  const faults = { refuses: 0.05, unfair: 0.05, misread: 0.1, wrongMeets: 0.1 };
  const whole = trials(faults, 0, 120);

  test("whatever their size and order", () => {
    const [a, b, c] = [trials(faults, 0, 7), trials(faults, 7, 90), trials(faults, 90, 120)];
    expect(addTallies(addTallies(c, a), b)).toEqual(whole);
  });

  test("twice gives the same bytes", () => expect(JSON.stringify(trials(faults, 0, 120))).toBe(JSON.stringify(whole)));

  test("of failing cases the first five of each line stay, with what is wrong", () => {
    const of = (line: string) => whole.failing.filter((one) => one.line === line);
    for (const line of ["solvable", "read", "guess"]) {
      expect(of(line)).toHaveLength(5);
      expect(of(line).map(({ n }) => n)).toEqual([...of(line).map(({ n }) => n)].sort((x, y) => x - y));
    }
    expect(of("solvable").map(({ note }) => note)).toContain("not built: no fair case in 10 draws");
    expect(of("solvable").map(({ note }) => note)).toContain("unfair: share 2, fair is 0 to 1");
    expect(of("read")[0]!.note).toBe("outside: Value");
  });
});

test("what is counted is what was tried", () => {
  const { lines, built, draws, mostDraws } = trials({}, 0, 300);
  expect(lines.solvable).toEqual({ tried: 300, met: 300 });
  expect(lines.read).toEqual({ tried: 300, met: 300 });
  expect(lines["wrong/other"]).toEqual({ tried: 300, met: 0 });
  expect(lines.guess!.tried).toBe(3000);
  // One of ten values, guessed evenly: 300 +- 16.4 (binomial).
  expect(Math.abs(lines.guess!.met - 300)).toBeLessThan(66);
  expect({ built, draws, mostDraws }).toEqual({ built: 300, draws: 600, mostDraws: 2 });
});

test("a case that cannot be built is tried no further", () => {
  const { lines, built } = trials({ refuses: 1 }, 0, 10);
  expect(lines).toEqual({ solvable: { tried: 10, met: 0 } });
  expect(built).toBe(0);
});

describe("a wrong method that gives the right answer", () => {
  test("is not counted in that case", () => {
    const counted = trials({ same: 0.5 }, 0, 200).lines["wrong/other"]!;
    expect(counted.tried > 60 && counted.tried < 140).toBe(true);
    expect(counted.met).toBe(0);
  });
  test("in every case, has its line all the same, and harms nobody", () => {
    const tally = trials({ same: 1 }, 0, 20);
    expect(tally.lines["wrong/other"]).toEqual({ tried: 0, met: 0 });
    expect(verdict(tally, "wrong/other")).toMatchObject({ within: true, rate: 0 });
  });
});

describe("the bounds", () => {
  const counted = (lines: Tally["lines"]): Tally => ({ ...emptyTally(), lines });
  // Lower bounds of 970 and 969 of 1 000: 95.74 % and 95.63 %; of 97 of 100: 91.5 %.
  test.each([
    ["solvable", 1000, 1000, true],
    ["solvable", 999, 1000, false],
    ["solvable", 0, 0, false],
    ["read", 970, 1000, true],
    ["read", 969, 1000, false],
    ["read", 97, 100, false],
    ["read", 0, 0, false],
    ["wrong/other", 50, 1000, true],
    ["wrong/other", 51, 1000, false],
    ["guess", 100, 10_000, true],
    ["guess", 101, 10_000, false],
    ["guess", 0, 0, false],
  ])("%s %i of %i: %s", (id, met, tried, within) =>
    expect(verdict(counted({ [id]: { tried, met } }), id)).toMatchObject({ met, tried, within }),
  );

  test("whole cases have a line where the trial leaves the samples out", () => {
    const kind = sampleKind();
    const search = { ...kind, trial: { ...kind.trial, whole: false } };
    const lines = judgeTally(search, samplePlan, counted({ whole: { tried: 25, met: 24 } }));
    expect(lines.find(({ id }) => id === "whole")).toMatchObject({ tried: 25, met: 24, within: false });
    expect(verdict(counted({ whole: { tried: 25, met: 24 } }), "whole")).toBeUndefined();
  });
});

describe("a whole case", () => {
  test("is built, worked and marked", () =>
    expect(tryWholeCase(sampleKind(), samplePlan, BASE, 4).lines).toEqual({ whole: { tried: 1, met: 1 } }));
  test("adds no draws to those of the tried cases", () =>
    expect(tryWholeCase(sampleKind(), samplePlan, BASE, 4)).toMatchObject({ built: 0, draws: 0 }));
});

test("the hand-in of a failing case is found again by its line and number", () => {
  const kind = sampleKind({ misread: 0.2 });
  const { failing } = trials({ misread: 0.2 }, 0, 40);
  const { n } = failing.find(({ line }) => line === "read")!;
  const seedHex = caseSeed(BASE, n, "case");
  const built = kind.trial.build(seedHex, samplePlan);
  const answers = handInOf(kind, samplePlan, built, seedHex, "read", 0);
  expect(kind.trial.judge(built, samplePlan, answers).met).toBe(false);
  expect(() => handInOf(kind, samplePlan, built, seedHex, "wrong/none", 0)).toThrow(/no line wrong\/none/);
});
