import "server-only";
import { select } from "@/lib/db";
import type { DecidableCase } from "@/lib/policies/decidability";
import { isSittingComplete } from "@/lib/policies/isSittingComplete";
import { Closing, Decision, Employer, Release, Sitting } from "@/models";
import { tellDeciders } from "./tellDeciders";
import { transact } from "./transact";

/**
 * Sittings whose last day has passed in their employer's time zone, with no case on its way, go to the decider as they
 * are. Each in a transaction of its own: killed half way, the rest are found the next time; run twice, nobody is told twice.
 * @returns how many were closed
 */
export async function closeSittings(publicOrigin: string, now = new Date()): Promise<number> {
  const due = await select<{ id: string }>(DUE, { now });
  let closed = 0;
  for (const { id } of due) closed += (await closeSitting(id, publicOrigin, now)) ? 1 : 0;
  return closed;
}

async function closeSitting(id: string, publicOrigin: string, now: Date): Promise<boolean> {
  const { employerId } = await Sitting.findByPk(id, { rejectOnEmpty: true });
  return transact({ personId: "", employerId }, async (transaction) => {
    // Whoever marks, decides or closes takes this lock, so the deciders hear of it from one of them only.
    const lock = transaction.LOCK.UPDATE;
    const sitting = await Sitting.findByPk(id, { transaction, lock, rejectOnEmpty: true });
    const where = { sittingId: id };
    if ((await Closing.count({ where, transaction })) || (await Decision.count({ where, transaction }))) return false;
    const attributes = { exclude: ["source", "tree"] };
    const release = await Release.findByPk(sitting.releaseId, { attributes, transaction, rejectOnEmpty: true });
    const employer = await Employer.findByPk(employerId, { transaction, rejectOnEmpty: true });
    const cases = await select<DecidableCase & { number: number }>(CASES, { id }, transaction);
    // A case that was asked for before the last day ended is marked first; this is looked at again then.
    if (cases.some(({ state }) => state !== "marked")) return false;
    const unfinished = !isSittingComplete(release.checks, release.frontMatter.sitting, cases);
    await Closing.create({ sittingId: id, unfinished, closedAt: now }, { transaction });
    const marked = new Set(cases.map(({ checkId }) => checkId)).size;
    const why = `Its last day, ${sitting.lastDay}, has passed; ${marked} of ${release.checks.length} checks have a marking record.`;
    // One that was complete was told when its last case was marked.
    if (unfinished) await tellDeciders({ sitting, release, employer }, { publicOrigin, now, why }, transaction);
    return true;
  });
}

const DUE = `
  SELECT s.id FROM sittings s JOIN employers e ON e.id = s.employer_id
  WHERE s.last_day < (:now::timestamptz AT TIME ZONE e.time_zone)::date
    AND NOT EXISTS (SELECT 1 FROM closings k WHERE k.sitting_id = s.id)
    AND NOT EXISTS (SELECT 1 FROM decisions d WHERE d.sitting_id = s.id)
    AND NOT EXISTS (SELECT 1 FROM case_states x WHERE x.sitting_id = s.id AND x.state <> 'marked')
  ORDER BY s.last_day, s.id LIMIT 500`;
const CASES = `SELECT check_id AS "checkId", number, state, met FROM case_states WHERE sitting_id = :id`;
