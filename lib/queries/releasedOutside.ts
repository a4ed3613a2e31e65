import "server-only";
import type { CheckPlan } from "@/lib/checks/kind";
import type { LineVerdict } from "@/lib/checks/release-check/judgeTally";
import type { Tally } from "@/lib/checks/release-check/tally";
import { select } from "@/lib/db";
import { linesOf } from "@/lib/release-checks/judgeRelease";

type Row = { checkId: string | null; reason: string; plan: CheckPlan | null; tally: Tally | null };

/** What a lead released although the release check was outside a bound; `checkId` null: the sitting as a whole. */
export type ReleasedOutside = { checkId: string | null; reason: string; lines: LineVerdict[] };

export async function releasedOutside(releaseId: string): Promise<ReleasedOutside[]> {
  const rows = await select<Row>(OUTSIDE, { releaseId });
  return rows.map(({ checkId, reason, plan, tally }) => ({
    checkId,
    reason,
    lines: plan && tally ? linesOf(plan, tally).filter(({ within }) => !within) : [],
  }));
}

const OUTSIDE = `
  SELECT u.check_id AS "checkId", u.reason, c.plan, c.tally FROM released_checks u
  LEFT JOIN release_checks c ON c.id = u.release_check_id
  WHERE u.release_id = :releaseId AND NOT u.within ORDER BY u.check_id NULLS LAST`;
