import type { Answers, BuiltCase } from "@/lib/checks/kind";
import { KINDS } from "@/lib/checks/registry";
import type { TriedKind } from "@/lib/checks/release-check/tryCase";
import { planOf } from "./planOf";

/** Kinds that the release check tries. What a lead's own text asks has no defaults and is tested by itself. */
export const KINDS_TRIED = KINDS.filter((kind): kind is TriedKind => kind.trial !== undefined && !kind.ofPlan);

const made = new Map<string, BuiltCase>();

/** A case as the release check makes it, once for all that is tried on it. `over` replaces single parameters. */
export function caseOf(kind: TriedKind, seed: string, over: object = {}): BuiltCase {
  const name = `${kind.id} ${seed} ${JSON.stringify(over)}`;
  const built = made.get(name) ?? kind.trial.build(seed, planOf(kind, over));
  made.set(name, built);
  return built;
}

/** The right method on it, which may not look at the truth; of a search kind, whose samples are left out, what it would find. */
export const rightAnswers = (kind: TriedKind, built: BuiltCase, over: object = {}): Answers =>
  kind.trial.solve
    ? kind.trial.solve(built, planOf(kind, over))
    : kind.solve({ ...built, truth: null }, planOf(kind, over));
