import type { CheckPlan } from "@/lib/checks/kind";
import { kindOf } from "@/lib/checks/registry";
import type { TriedKind } from "@/lib/checks/release-check/tryCase";

/** The kind of a plan, where a machine marks it and people who never existed can try it; else null. */
export function triedKind({ kind, version }: Pick<CheckPlan, "kind" | "version">): TriedKind | null {
  const found = kindOf(kind, version);
  return found.trial ? (found as TriedKind) : null;
}
