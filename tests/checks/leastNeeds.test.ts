import { expect, test } from "vitest";
import { falseLock } from "@/lib/checks/false-lock/falseLock";
import type { CheckKind, CheckPlan, Marking } from "@/lib/checks/kind";
import { leastNeeds } from "@/lib/checks/leastNeeds";
import type { TriedKind } from "@/lib/checks/release-check/tryCase";
import { planOf, seeds } from "./planOf";
import { caseOf, KINDS_TRIED, rightAnswers } from "./triedCases";

// The release check tries a thousand; here it is seen that a method misses what it names, by the marking itself.
const SEEDS = seeds(4);
const MANY_SEEDS = seeds(12);

/** With nothing there two of the interferer's wrong ways come to the right answer, as the kind says. */
const PARAMETERS: Readonly<Record<string, object>> = { interferer: { nothing: 0 } };

/** Every quantity as the kind has it, as a release stores them. */
const quantitiesOf = (kind: CheckKind): CheckPlan["quantities"] =>
  kind.quantities.map(({ id, tolerance, critical }) => ({ of: id, tolerance, critical }));

function markedOf(kind: TriedKind, method: string, seed: string, needs: number): Marking {
  const built = caseOf(kind, seed, PARAMETERS[kind.id]);
  const plan = { ...planOf(kind, PARAMETERS[kind.id]), needs };
  return kind.trial.judge(built, plan, kind.wrongMethods[method]!.solve(built, plan));
}

/** A method that names nothing goes wrong in some cases only, such as those with one cause: cases in which it does. */
function seedsOf(kind: TriedKind, method: string): string[] {
  if (kind.wrongMethods[method]!.misses.length > 0) return SEEDS;
  return MANY_SEEDS.filter((seed) => !saysTheRight(kind, method, seed)).slice(0, SEEDS.length);
}

function saysTheRight(kind: TriedKind, method: string, seed: string): boolean {
  const built = caseOf(kind, seed, PARAMETERS[kind.id]);
  const answers = kind.wrongMethods[method]!.solve(built, planOf(kind, PARAMETERS[kind.id]));
  return JSON.stringify(answers) === JSON.stringify(rightAnswers(kind, built, PARAMETERS[kind.id]));
}

const methods = KINDS_TRIED.flatMap((kind) => Object.keys(kind.wrongMethods).map((method) => [kind, method] as const));

test.each(methods.map(([kind, method]) => [kind.id, method, kind] as const))(
  "%s: %s misses what it says and does not meet a check that needs as many as it must",
  (_id, method, kind) => {
    const needs = leastNeeds(kind, quantitiesOf(kind))?.needs ?? 1;
    const tried = seedsOf(kind, method);
    expect(tried.length).toBeGreaterThan(0);
    for (const seed of tried) {
      const { quantities, met } = markedOf(kind, method, seed, needs);
      const outside = quantities.filter(({ within }) => !within).map(({ of }) => of);
      expect(outside, seed).toEqual(expect.arrayContaining([...kind.wrongMethods[method]!.misses]));
      expect(met, seed).toBe(false);
    }
  },
);

// Where a number is asked for at all.
const asking = KINDS_TRIED.flatMap((kind) => {
  const least = leastNeeds(kind, quantitiesOf(kind));
  return least ? [[kind.id, kind, least] as const] : [];
});
test.each(asking)("%s: one fewer is met by the method that is named", (_id, kind, least) => {
  const [method] = Object.entries(kind.wrongMethods).find(([, { label }]) => label === least.method)!;
  expect(MANY_SEEDS.some((seed) => markedOf(kind, method, seed, least.needs - 1).met)).toBe(true);
});

test("a missed quantity made critical frees the number", () => {
  const all = quantitiesOf(falseLock as CheckKind);
  const critical = all.map((quantity) => ({ ...quantity, critical: quantity.critical || quantity.of !== "parent" }));
  expect(leastNeeds(falseLock as CheckKind, critical)).toBeNull();
});

test("a method is not held against a check that does not ask about its mistakes", () => {
  const asked = quantitiesOf(falseLock as CheckKind).filter(({ of }) => ["verdict", "parent"].includes(of));
  expect(leastNeeds(falseLock as CheckKind, asked)).toBeNull();
});
