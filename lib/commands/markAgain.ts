import "server-only";
import {
  Employer,
  MarkingRecord,
  MarkingReview,
  Person,
  Release,
  ReviewAct,
  ReviewFinding,
  Sitting,
  Case,
} from "@/models";
import type { Transaction } from "sequelize";
import { markingColumns } from "./computeMarking";
import { tellMarkedAgain } from "./tellMarkedAgain";
import { transact } from "./transact";
import { writeMail } from "./writeMail";

/**
 * Add to every case of a sitting that the review found different the record of the corrected marking, and tell who is
 * concerned. Run twice, or over a case that has got another record since, it adds nothing.
 */
export async function markAgain(
  actId: string,
  publicOrigin: string,
  now = () => new Date(),
): Promise<"marked again" | "was marked again"> {
  const act = await ReviewAct.findByPk(actId, { rejectOnEmpty: true });
  const review = await MarkingReview.findByPk(act.reviewId, { rejectOnEmpty: true });
  const { employerId } = review;
  // The lead's act, carried out for the lead: the trail names the person.
  return transact({ personId: act.actedBy, employerId }, async (transaction) => {
    const lock = transaction.LOCK.UPDATE;
    const sitting = await Sitting.findByPk(act.sittingId, { transaction, lock, rejectOnEmpty: true });
    let added = 0;
    for (const finding of await findingsOf(act, transaction))
      added += await follow(finding, review, now(), transaction);
    if (added === 0) return "was marked again";
    const attributes = { exclude: ["source", "tree"] };
    const release = await Release.findByPk(sitting.releaseId, { attributes, transaction, rejectOnEmpty: true });
    const employer = await Employer.findByPk(employerId, { transaction, rejectOnEmpty: true });
    const technician = await Person.findByPk(sitting.technicianId, { transaction, rejectOnEmpty: true });
    const body = `The marking of your sitting S-${sitting.number} of "${release.title}" was corrected, and your hand-in is marked again.\n\n${review.reason}\n\nThe earlier record is kept beside the new one:\n\n${publicOrigin}/${employer.slug}/sittings/${sitting.id}\n`;
    await writeMail({ to: technician.email, subject: `Marked again: ${release.title}`, body }, transaction);
    await tellMarkedAgain({ sitting, release, employer, technician }, { publicOrigin, now: now() }, transaction);
    return "marked again";
  });
}

async function findingsOf({ reviewId, sittingId }: ReviewAct, transaction: Transaction): Promise<ReviewFinding[]> {
  const cases = await Case.findAll({ where: { sittingId }, attributes: ["id"], transaction });
  const findings = await ReviewFinding.findAll({
    where: { reviewId, caseId: cases.map(({ id }) => id) },
    order: [["caseId", "ASC"]],
    transaction,
  });
  return findings.filter(({ met, metBefore, changedRows }) => met !== metBefore || changedRows.length > 0);
}

async function follow(
  { caseId, recordId, marking, engineVersion, durationMs }: ReviewFinding,
  { reason }: MarkingReview,
  markedAt: Date,
  transaction: Transaction,
): Promise<number> {
  const where = { caseId };
  const newest = await MarkingRecord.findOne({
    where,
    order: [["sequence", "DESC"]],
    transaction,
    rejectOnEmpty: true,
  });
  if (newest.id !== recordId) return 0;
  const record = { caseId, sequence: newest.sequence + 1, engineVersion, durationMs, reason, markedAt };
  await MarkingRecord.create({ ...record, ...markingColumns(marking) }, { transaction });
  return 1;
}
