import "server-only";
import type { Transaction } from "sequelize";
import type { CheckPlan } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import { enqueue } from "@/lib/jobs/enqueue";
import type { Actor } from "@/lib/policies/actor";
import { releaseCheckFingerprint } from "@/lib/release-checks/releaseCheckFingerprint";
import { triedKind } from "@/lib/release-checks/triedKind";
import { ReleaseCheck } from "@/models";
import { readOwnDraft } from "./readOwnDraft";
import { transact } from "./transact";

/**
 * Ask for the release check of every check of a draft that has none of its fingerprint yet, or for a look at fewer cases. What
 * is under way already goes on, what was stopped or failed takes up where it stood; nothing is computed twice.
 */
export async function askReleaseCheck(
  actor: Actor,
  { moduleId, preview }: { moduleId: string; preview: boolean },
  now = new Date(),
): Promise<{ asked: number }> {
  const { checks } = await readOwnDraft(actor, moduleId);
  const tried = new Map(checks.filter(triedKind).map((plan) => [releaseCheckFingerprint(plan), plan]));
  return transact(actor, async (transaction) => {
    let asked = 0;
    for (const [fingerprint, plan] of tried) {
      if (await ask(actor, { fingerprint, plan, preview }, now, transaction)) asked += 1;
    }
    return { asked };
  });
}

type Asked = { fingerprint: string; plan: CheckPlan; preview: boolean };

async function ask(actor: Actor, { fingerprint, plan, preview }: Asked, now: Date, transaction: Transaction) {
  if (!preview && (await ReleaseCheck.count({ where: { fingerprint }, transaction }))) return false;
  const { employerId, personId } = actor;
  const given = { fingerprint, preview, plan: JSON.stringify(plan), employerId, personId, now };
  const [added] = await select<{ id: string }>(ADD_UNLESS_THERE, given, transaction);
  const [run] = added ? [added] : await select<{ id: string }>(TAKE_UP, { fingerprint, preview }, transaction);
  if (!run) return false;
  await enqueue("check-release", { runId: run.id }, transaction);
  return true;
}

const ADD_UNLESS_THERE = `
  INSERT INTO release_check_runs (fingerprint, preview, plan, employer_id, asked_by, asked_at)
  VALUES (:fingerprint, :preview, :plan, :employerId, :personId, :now)
  ON CONFLICT (fingerprint, preview) DO NOTHING RETURNING id`;
const TAKE_UP = `
  UPDATE release_check_runs r SET stopped_at = NULL
  WHERE fingerprint = :fingerprint AND preview = :preview AND finished_at IS NULL AND (stopped_at IS NOT NULL
    OR EXISTS (SELECT 1 FROM progress p WHERE p.subject_id = r.id AND p.job = 'check-release' AND p.fault IS NOT NULL))
  RETURNING id`;
