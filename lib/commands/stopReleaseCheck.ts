import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { releaseCheckFingerprint } from "@/lib/release-checks/releaseCheckFingerprint";
import { readOwnDraft } from "./readOwnDraft";
import { transact } from "./transact";

/** Stop what the own firm asked for. What was counted stays: asked again, it goes on from there. */
export async function stopReleaseCheck(actor: Actor, { moduleId }: { moduleId: string }, now = new Date()) {
  const { checks } = await readOwnDraft(actor, moduleId);
  const fingerprints = checks.map(releaseCheckFingerprint);
  if (fingerprints.length === 0) return { stopped: 0 };
  return transact(actor, async (transaction) => {
    const { employerId } = actor;
    const stopped = await select<{ id: string }>(STOP, { fingerprints, employerId, now }, transaction);
    return { stopped: stopped.length };
  });
}

const STOP = `
  UPDATE release_check_runs SET stopped_at = :now
  WHERE fingerprint IN (:fingerprints) AND employer_id = :employerId AND stopped_at IS NULL AND finished_at IS NULL
  RETURNING id`;
