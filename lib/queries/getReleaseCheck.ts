import "server-only";
import type { SittingRates } from "@/lib/checks/release-check/sittingRates";
import { select } from "@/lib/db";
import { readModule } from "@/lib/mdx/readModule";
import type { Actor } from "@/lib/policies/actor";
import { can } from "@/lib/policies/can";
import { judgeRelease } from "@/lib/release-checks/judgeRelease";
import { isId } from "./findOwn";
import { checkTrialView, resultsOf, runsOf, type CheckTrialView } from "./checkTrialView";

type DraftRow = { moduleId: string; code: string; title: string; source: string; revision: number };

export type ReleaseCheckView = {
  moduleId: string;
  code: string;
  title: string;
  revision: number;
  /** A draft with a fault in it has no checks to try. */
  errors: number;
  checks: CheckTrialView[];
  freshCases: number;
  /** Null until the release check of every check has finished. */
  sitting: SittingRates | null;
};

/** How the checks of a draft stand with their release check; null when the employer has no such module, or for whoever may not look. */
export async function getReleaseCheck(actor: Actor, moduleId: string): Promise<ReleaseCheckView | null> {
  if (!can.releaseModule(actor, actor) || !isId(moduleId)) return null;
  const [draft] = await select<DraftRow>(DRAFT, { moduleId, employerId: actor.employerId });
  if (!draft) return null;
  const { source, ...head } = draft;
  const { module: checked, problems } = await readModule(source);
  const errors = problems.filter(({ severity }) => severity === "error").length;
  if (!checked) return { ...head, errors, checks: [], freshCases: 0, sitting: null };
  const { checks: plans, frontMatter } = checked;
  const results = await resultsOf(plans);
  const tallies = new Map(results.map(({ fingerprint, tally }) => [fingerprint, tally]));
  const { checks, sitting } = judgeRelease(plans, frontMatter, tallies);
  const runs = await runsOf(checks, actor.employerId);
  return {
    ...head,
    errors,
    checks: checks.map((check) => checkTrialView(check, results, runs)),
    freshCases: frontMatter.sitting.freshCases,
    sitting,
  };
}

const DRAFT = `
  SELECT m.id AS "moduleId", m.code, d.title, d.source, d.revision FROM modules m JOIN drafts d ON d.module_id = m.id
  WHERE m.id = :moduleId AND m.employer_id = :employerId`;
