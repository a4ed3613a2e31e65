import { describe, expect, test } from "vitest";
import { correlatorReading } from "@/lib/checks/correlator-reading/correlatorReading";
import { drawCase } from "@/lib/checks/correlator-reading/drawCase";
import { markAnswers as markReading } from "@/lib/checks/correlator-reading/markAnswers";
import { publicCase as readingCase } from "@/lib/checks/correlator-reading/publicCase";
import { falseLock } from "@/lib/checks/false-lock/falseLock";
import { markAnswers as markFalseLock } from "@/lib/checks/false-lock/markAnswers";
import { publicCase as falseLockCase } from "@/lib/checks/false-lock/publicCase";
import type { InterfererTruth } from "@/lib/checks/interferer/drawCase";
import { interferer } from "@/lib/checks/interferer/interferer";
import { markAnswers as markInterferer } from "@/lib/checks/interferer/markAnswers";
import type { BuiltCase, CheckKind, CheckPlan, Marking } from "@/lib/checks/kind";
import { leastNeeds } from "@/lib/checks/leastNeeds";
import { KINDS } from "@/lib/checks/registry";
import { drawScene } from "@/lib/checks/satellites/drawScene";
import { markAnswers as markSatellites } from "@/lib/checks/satellites/markAnswers";
import { publicCase as satellitesCase } from "@/lib/checks/satellites/publicCase";
import { satellites } from "@/lib/checks/satellites/satellites";
import { drawCase as drawPlan } from "@/lib/checks/search-plan/drawCase";
import { markAnswers as markPlan } from "@/lib/checks/search-plan/markAnswers";
import { publicCase as planCase } from "@/lib/checks/search-plan/publicCase";
import { searchPlan } from "@/lib/checks/search-plan/searchPlan";
import { sceneFor } from "./false-lock/sceneFor";
import { planOf, seeds } from "./planOf";

const SLOW = 120_000;
const SEEDS = seeds(12);

/** Every quantity as the kind has it, as a release stores them. */
const quantitiesOf = (kind: CheckKind): CheckPlan["quantities"] =>
  kind.quantities.map(({ id, tolerance, critical }) => ({ of: id, tolerance, critical }));

type Tried = { needs: number | null; method: string; seed: string };

/** What the marking says of a wrong method, without making a capture; kinds that came before trials likewise. */
const MARKED: Readonly<Record<string, (one: Tried) => Marking>> = {
  "correlator-reading": ({ needs, method, seed }) => {
    const plan = { ...planOf(correlatorReading), needs };
    const { truth } = drawCase(seed, plan.parameters);
    const built = { truth, publicCase: readingCase(truth, plan), files: [], draws: 1 };
    return markReading(truth, plan, correlatorReading.wrongMethods[method]!.solve(built, plan));
  },
  "false-lock": ({ needs, method, seed }) => {
    const plan = { ...planOf(falseLock), needs };
    const { truth } = sceneFor(seed);
    const built = { truth, publicCase: falseLockCase(truth, plan), files: [], draws: 1 };
    const answers = falseLock.wrongMethods[method]!.solve(built, plan);
    return markFalseLock(truth, plan, answers, { searched: [], weakPeak: null });
  },
  satellites: ({ needs, method, seed }) => {
    const plan = { ...planOf(satellites), needs };
    const { truth } = drawScene(seed, plan.parameters);
    const built = { truth, publicCase: satellitesCase(truth, plan), files: [], draws: 1 };
    return markSatellites(truth, plan, satellites.wrongMethods[method]!.solve(built, plan), []);
  },
  "search-plan": ({ needs, method, seed }) => {
    const plan = { ...planOf(searchPlan), needs };
    const { truth } = drawPlan(seed, plan.parameters);
    const built: BuiltCase<typeof truth> = { truth, publicCase: planCase(truth, plan), files: [], draws: 1 };
    return markPlan(seed, truth, plan, searchPlan.wrongMethods[method]!.solve(built, plan));
  },
  // With nothing there two of the wrong ways come to the right answer, as the kind says.
  interferer: ({ needs, method, seed }) => {
    const plan = { ...planOf(interferer, { nothing: 0 }), needs };
    const built = caseOf(interferer as CheckKind, seed, plan) as BuiltCase<InterfererTruth>;
    return markInterferer(built.truth, plan, interferer.wrongMethods[method]!.solve(built, plan));
  },
};

const made = new Map<string, BuiltCase>();

/** A case as the kind's trial makes it, once for all methods. */
function caseOf(kind: CheckKind, seed: string, plan: CheckPlan = planOf(kind)): BuiltCase {
  const name = `${kind.id} ${seed}`;
  const known = made.get(name) ?? (kind.trial ?? kind).build(seed, plan);
  made.set(name, known);
  return known;
}

/** Any other kind: its case is quickly made. */
function markedOf(kind: CheckKind, tried: Tried): Marking {
  if (MARKED[kind.id]) return MARKED[kind.id]!(tried);
  const { needs, method, seed } = tried;
  const plan = { ...planOf(kind), needs };
  const built = caseOf(kind, seed);
  const answers = kind.wrongMethods[method]!.solve(built, plan);
  return kind.trial ? kind.trial.judge(built, plan, answers) : kind.mark(seed, plan, answers);
}

/** A method that goes wrong in some cases only, such as those with one cause, says in the others what the right one says. */
function saysTheRight(kind: CheckKind, method: string, seed: string): boolean {
  if (MARKED[kind.id] || kind.wrongMethods[method]!.misses.length > 0) return false;
  const built = caseOf(kind, seed);
  const plan = planOf(kind);
  return JSON.stringify(kind.wrongMethods[method]!.solve(built, plan)) === JSON.stringify(kind.solve(built, plan));
}

const methods = KINDS.flatMap((kind) => Object.keys(kind.wrongMethods).map((method) => [kind, method] as const));

describe.each(methods.map(([kind, method]) => [`${kind.id} ${method}`, kind, method] as const))(
  "%s",
  (_name, kind, method) => {
    test("misses what it says in every case, by the marking itself", { timeout: SLOW }, () => {
      for (const seed of SEEDS) {
        const { quantities } = markedOf(kind, { needs: null, method, seed });
        const outside = quantities.filter(({ within }) => !within).map(({ of }) => of);
        expect(outside, seed).toEqual(expect.arrayContaining([...kind.wrongMethods[method]!.misses]));
      }
    });

    test("does not meet a check that needs as many as it must", { timeout: SLOW }, () => {
      const least = leastNeeds(kind, quantitiesOf(kind));
      for (const seed of SEEDS) {
        if (saysTheRight(kind, method, seed)) continue;
        expect(markedOf(kind, { needs: least?.needs ?? 1, method, seed }).met, seed).toBe(false);
      }
    });
  },
);

test("one fewer is met by the method that is named", { timeout: SLOW }, () => {
  for (const kind of KINDS) {
    const least = leastNeeds(kind, quantitiesOf(kind));
    if (!least) continue; // any number will do
    const [method] = Object.entries(kind.wrongMethods).find(([, { label }]) => label === least.method)!;
    const met = SEEDS.map((seed) => markedOf(kind, { needs: least.needs - 1, method, seed }).met);
    expect(met, kind.id).toContain(true);
  }
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
