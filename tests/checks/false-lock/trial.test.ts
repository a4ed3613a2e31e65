import { expect, test } from "vitest";
import { falseLock as kind } from "@/lib/checks/false-lock/falseLock";
import { publicCase } from "@/lib/checks/false-lock/publicCase";
import { falseLockTrial as trial } from "@/lib/checks/false-lock/trial";
import { seededRandom } from "@/lib/numeric/random";
import { planOf, seeds } from "../planOf";
import { sceneFor } from "./sceneFor";

const plan = planOf(kind);
const built = seeds(6).map((seed) => ({ seed, ...trial.build(seed, plan) }));
const read = (n: number) => trial.read(built[n]!, plan, seededRandom(built[n]!.seed, "read"));

test("the case is the first scene that can be judged", () => {
  const { seed, truth, publicCase: shown, files, draws } = built[0]!;
  expect({ truth, draws }).toEqual(sceneFor(seed));
  expect({ shown, files }).toEqual({ shown: publicCase(truth, plan), files: [] });
});

test("the right answers meet it", () => {
  for (const one of built) expect(trial.judge(one, plan, trial.solve!(one, plan)).met).toBe(true);
});

test("a careful reading has the verdicts and the Doppler; its C/N0 is off, and the same every time", () => {
  built.forEach((one, n) => {
    const { quantities } = trial.judge(one, plan, read(n));
    const outside = quantities.filter(({ of, within }) => of !== "falseCn0" && !within);
    expect(outside).toEqual([]);
    expect(read(n)).toEqual(read(n));
    expect(read(n)["falseLock.cn0"]).not.toBe(trial.solve!(one, plan)["falseLock.cn0"]);
  });
});

test("a guess fills in the whole form and does not meet the check", () => {
  for (const one of built) {
    const guess = trial.guess(one.publicCase, plan, seededRandom(one.seed, "guess"));
    const fields = one.publicCase.sections.flatMap(({ id, fields: own }) => own.map((field) => `${id}.${field.id}`));
    expect(Object.keys(guess).sort()).toEqual(fields.sort());
    expect(trial.judge(one, plan, guess).met).toBe(false);
  }
});

test("a case is fair inside its bands; one whose weak satellite the search would miss is not", () => {
  const fair = (one: (typeof built)[number]) =>
    trial.difficulty(one, plan).every(({ value, from, to }) => value >= from && value <= to);
  expect(built.every(fair)).toBe(true);
  const withWeak = built.find(({ truth }) => truth.scene.satellites.some(({ prn }) => prn === truth.weakPrn))!;
  const { truth } = withWeak;
  const satellites = truth.scene.satellites.map((s) => (s.prn === truth.weakPrn ? { ...s, cn0DbHz: 26 } : s));
  expect(fair({ ...withWeak, truth: { ...truth, scene: { ...truth.scene, satellites } } })).toBe(false);
});
