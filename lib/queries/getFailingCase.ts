import "server-only";
import { select } from "@/lib/db";
import { readModule } from "@/lib/mdx/readModule";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { showFailing, type FailingCase, type TriedHandIn } from "@/lib/release-checks/showFailing";
import { triedKind } from "@/lib/release-checks/triedKind";
import { isId } from "./findOwn";

export type FailingCaseView = FailingCase & { code: string; checkId: string; title: string; n: number };

/**
 * A case that the release check tried, with its truth and how the hand-in was marked, for a lead who writes the check. Its seed
 * follows from the check's own text and is drawn for nobody: a sitting's seed comes from the machine's random source.
 */
export async function getFailingCase(
  actor: Actor,
  moduleId: string,
  { checkId, ...tried }: TriedHandIn & { checkId: string },
): Promise<FailingCaseView | null> {
  authorize(can.releaseModule(actor, actor), "look at the release check");
  if (!isId(moduleId)) return null;
  const [draft] = await select<{ code: string; source: string }>(DRAFT, { moduleId, employerId: actor.employerId });
  if (!draft) return null;
  const plan = (await readModule(draft.source)).module?.checks.find(({ id }) => id === checkId);
  const kind = plan && triedKind(plan);
  const shown = kind && showFailing(kind, plan, tried);
  return shown ? { ...shown, code: draft.code, checkId, title: plan.title, n: tried.n } : null;
}

const DRAFT = `
  SELECT m.code, d.source FROM modules m JOIN drafts d ON d.module_id = m.id
  WHERE m.id = :moduleId AND m.employer_id = :employerId`;
