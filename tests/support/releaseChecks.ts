import { wrongMethodsOf } from "@/lib/checks/definitionsOf";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { CheckPlan } from "@/lib/checks/kind";
import type { Count, Tally } from "@/lib/checks/release-check/tally";
import { releaseCheckFingerprint } from "@/lib/release-checks/releaseCheckFingerprint";
import { triedKind } from "@/lib/release-checks/triedKind";
import { NOW } from "./clock";
import { insert } from "./owner";

/** A tally with every line inside its bound; `over` replaces single lines. */
export function soundTally(plan: CheckPlan, over: Record<string, Count> = {}): Tally {
  const kind = triedKind(plan)!;
  const wrong = Object.keys(wrongMethodsOf(kind, plan)).map((name) => [`wrong/${name}`, { tried: 1000, met: 0 }]);
  return {
    lines: {
      ...{ solvable: { tried: 1000, met: 1000 }, read: { tried: 1000, met: 990 }, guess: { tried: 10_000, met: 1 } },
      ...(kind.trial.whole ? {} : { whole: { tried: 25, met: 25 } }),
      ...Object.fromEntries(wrong),
      ...over,
    },
    ...{ built: 1000, draws: 1200, mostDraws: 3, failing: [] },
  };
}

/** A finished release check of one plan. */
export const makeReleaseCheck = (plan: CheckPlan, over: Record<string, Count> = {}) =>
  insert<{ id: string; fingerprint: string }>("release_checks", {
    fingerprint: releaseCheckFingerprint(plan),
    plan,
    engineVersion: ENGINE_VERSION,
    tally: soundTally(plan, over),
    finishedAt: NOW,
  });

/** Of every check that a machine marks. */
export async function makeReleaseChecks(plans: readonly CheckPlan[]): Promise<void> {
  for (const plan of plans) if (triedKind(plan)) await makeReleaseCheck(plan);
}
