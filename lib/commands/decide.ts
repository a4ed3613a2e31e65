import "server-only";
import type { Transaction } from "sequelize";
import { requireAfresh } from "@/lib/policies/requireAfresh";
import { dayIn } from "@/lib/calendar";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { select } from "@/lib/db";
import { ConflictError, ForbiddenError } from "@/lib/errors";
import { webEnv } from "@/lib/env";
import { enqueue } from "@/lib/jobs/enqueue";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { decidability, type DecidableCase } from "@/lib/policies/decidability";
import { barsToDeciding } from "@/lib/policies/separation";
import { separationFacts } from "@/lib/queries/separationFacts";
import { Decision, Employer, Person, Release, type Sitting } from "@/models";
import type { Evidence, Outcome } from "@/models/Decision";
import { lockOwnSitting } from "./lockOwn";
import { transact } from "./transact";
import { writeMail } from "./writeMail";

type Signed = { sittingId: string; outcome: Outcome; reason: string; declaration: string };

/** Decide a sitting, signing in afresh. Refused for anyone who had a hand in release, assignment or training. */
export const decide = (actor: Actor, { sittingId, outcome, reason, declaration }: Signed, now = new Date()) =>
  transact(actor, async (transaction) => {
    const sitting = await lockOwnSitting(actor, sittingId, transaction);
    authorize(can.decide(actor, sitting), "decide on this sitting");
    const employer = await Employer.findByPk(sitting.employerId, { transaction, rejectOnEmpty: true });
    const today = dayIn(employer.timeZone, now);
    const [bar] = barsToDeciding(await separationFacts(actor, sitting, today, transaction));
    if (bar) throw new ForbiddenError(`You may not decide on this sitting. ${bar}`);
    const signedAfreshAt = requireAfresh(actor, now);
    if (await Decision.count({ where: { sittingId }, transaction }))
      throw new ConflictError("This sitting is decided already.");
    const release = await Release.findByPk(sitting.releaseId, { transaction, rejectOnEmpty: true });
    const cases = await select<DecidableCase>(CASES, { sittingId }, transaction);
    const ready = decidability(release.checks, release.frontMatter.require, cases, today > sitting.lastDay);
    if (!ready.decidable) throw new ConflictError(ready.reason);
    if (outcome === "competent" && !ready.requirementMet) {
      throw new ConflictError("The release's requirement is not met, so the decision can only be not yet competent.");
    }
    const evidence = await select<Evidence[number]>(EVIDENCE, { sittingId }, transaction);
    const decision = await Decision.create(
      {
        sittingId,
        outcome,
        reason,
        declaration,
        outsideLine: actor.outsideLine,
        evidence,
        evidenceSha256: fingerprintOf(evidence),
        signedAfreshAt,
        decidedBy: actor.personId,
        decidedAt: now,
      },
      { transaction },
    );
    if (outcome === "competent") await enqueue("issue-certificate", { decisionId: decision.id }, transaction);
    else await tellTechnician(sitting, employer, release.title, reason, transaction);
    return { id: decision.id };
  });

async function tellTechnician(
  sitting: Sitting,
  employer: Employer,
  title: string,
  reason: string,
  transaction: Transaction,
) {
  const technician = await Person.findByPk(sitting.technicianId, { transaction, rejectOnEmpty: true });
  await writeMail(
    {
      to: technician.email,
      subject: `Not yet competent: ${title}`,
      body: `Your sitting S-${sitting.number} of "${title}" is decided: not yet competent. A new sitting can be assigned.\n\nReasons\n${reason}\n\nYou may appeal within 30 days; the procedure is public.\n${webEnv().PUBLIC_ORIGIN}/impartiality\n${webEnv().PUBLIC_ORIGIN}/${employer.slug}/sittings/${sitting.id}\n`,
    },
    transaction,
  );
}

const CASES = `SELECT check_id AS "checkId", state, met FROM case_states WHERE sitting_id = :sittingId`;
const EVIDENCE = `
  SELECT s.check_id AS "checkId", s.id AS "caseId", m.id AS "markingRecordId", m.met, row_sha256(to_jsonb(m)) AS sha256
  FROM case_states s JOIN marking_records m ON m.id = s.record_id
  WHERE s.sitting_id = :sittingId ORDER BY s.check_id, s.number`;
