import { describe, expect, test } from "vitest";
import { satellites as kind } from "@/lib/checks/satellites/satellites";
import { satellitesTrial as trial } from "@/lib/checks/satellites/trial";
import { seededRandom } from "@/lib/numeric/random";
import { planOf, seedOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(10).map((seed) => ({ seed, ...trial.build(seed, plan) }));
const read = (n: number) => trial.read(built[n]!, plan, seededRandom(built[n]!.seed, "read"));

test("the case is the one a sitting would have, but for its samples", () => {
  const whole = kind.build(seedOf(3), plan);
  const { files, ...rest } = trial.build(seedOf(3), plan);
  expect(files).toEqual([]);
  expect(rest).toEqual({ truth: whole.truth, publicCase: whole.publicCase, draws: whole.draws });
});

test("the right answers meet it", () => {
  for (const one of built) expect(trial.judge(one, plan, trial.solve!(one, plan)).met).toBe(true);
});

describe("a careful reading", () => {
  test("names the satellites that must be found and none that is not there", () => {
    for (const [n, one] of built.entries()) {
      const marking = trial.judge(one, plan, read(n));
      const held = marking.quantities.filter(({ of }) => of === "found" || of === "invented");
      expect(held.map(({ within }) => within)).toEqual([true, true]);
    }
  });
  test("is off, and the same every time", () => {
    expect(read(0)).not.toEqual(trial.solve!(built[0]!, plan));
    expect(read(0)).toEqual(read(0));
  });
});

test("a guess fills in the whole form and is no list of this case", () => {
  for (const one of built) {
    const guess = trial.guess(one.publicCase, plan, seededRandom(one.seed, "guess"));
    expect(guess["search.bin"]).toMatch(/^\d/);
    expect(guess["satellites.4.cn0"]).toMatch(/^\d/);
    expect(trial.judge(one, plan, guess).met).toBe(false);
  }
});

test("a case is fair inside its bands; one with a satellite that hides among the noise is not", () => {
  const bands = (one: (typeof built)[number]) =>
    trial.difficulty(one, plan).every(({ value, from, to }) => value >= from && value <= to);
  expect(built.every(bands)).toBe(true);
  const [one] = built;
  const faint = { ...one!, truth: { ...one!.truth, foundFromDbHz: 24 } };
  faint.truth.scene = {
    ...faint.truth.scene,
    satellites: faint.truth.scene.satellites.map((s) => ({ ...s, cn0DbHz: 25 })),
  };
  expect(bands(faint)).toBe(false);
});
