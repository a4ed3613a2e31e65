import "server-only";
import type { Transaction } from "sequelize";
import { dayIn } from "@/lib/calendar";
import { select } from "@/lib/db";
import { ConflictError, InvalidError } from "@/lib/errors";
import { webEnv } from "@/lib/env";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { exposedUntil, exposureReason } from "@/lib/policies/exposure";
import { SITTING_FEE } from "@/lib/price";
import { openedCases } from "@/lib/queries/openedCases";
import { Assignment, Employer, Fee, type Release } from "@/models";
import { findOwnRelease } from "./lockOwn";
import { transact } from "./transact";
import { writeMail } from "./writeMail";

type Order = { releaseId: string; technicianId: string; dueOn: string; exposureNote: string | null };
type Addressed = { id: string; name: string; email: string };

/**
 * Give a technician a sitting of a release; its fee falls due now, whatever the outcome will be.
 * @param exposureNote why it is assigned although the technician has met a kind of check as often as may be; null when
 *   that is not so. With a note the limit does not hold in the sitting, and the decider reads it.
 */
export const assignRelease = (
  actor: Actor,
  { releaseId, technicianId, dueOn, exposureNote }: Order,
  now = new Date(),
) =>
  transact(actor, async (transaction) => {
    const release = await findOwnRelease(actor, releaseId, transaction);
    authorize(can.assignRelease(actor, release), "assign this release");
    const { employerId } = actor;
    const employer = await Employer.findByPk(employerId, { transaction, rejectOnEmpty: true });
    const today = dayIn(employer.timeZone, now);
    if (dueOn < today) throw new InvalidError("The day is past.", { dueOn: ["The day is past."] });
    const [technician] = await select<Addressed>(TECHNICIAN, { technicianId, employerId }, transaction);
    if (!technician) {
      throw new InvalidError("Choose a technician of your firm.", {
        technicianId: ["Choose a technician of your firm."],
      });
    }
    const open = await select(OPEN_ASSIGNMENT, { technicianId, moduleId: release.moduleId }, transaction);
    if (open.length) throw new ConflictError(`${technician.name} has an undecided sitting of this module already.`);
    if (!exposureNote) await refuseExposed(technician, release, { now, today }, transaction);
    const assignment = await Assignment.create(
      { employerId, releaseId, technicianId, dueOn, exposureNote: exposureNote || null, assignedBy: actor.personId },
      { transaction },
    );
    await Fee.create({ assignmentId: assignment.id, employerId, ...SITTING_FEE }, { transaction });
    const { PUBLIC_ORIGIN } = webEnv();
    await writeMail(
      {
        to: technician.email,
        subject: `Assigned to you: ${release.title}`,
        body: `${actor.name} assigned you "${release.title}", release ${release.number}, at ${employer.name}.\nSit it by ${dueOn}. You can read the module now; the sitting opens once its fee is settled.\n\n${PUBLIC_ORIGIN}/${employer.slug}/assignments/${assignment.id}\n`,
      },
      transaction,
    );
    for (const administrator of await select<Addressed>(ADMINISTRATORS, { employerId }, transaction)) {
      await writeMail(
        {
          to: administrator.email,
          subject: `A sitting fee is due: ${technician.name}, ${release.title}`,
          body: `${actor.name} assigned "${release.title}" to ${technician.name}. The fee is for the sitting and its decision, certificate included, and is the same whatever the outcome.\n\n${PUBLIC_ORIGIN}/${employer.slug}/counter\n`,
        },
        transaction,
      );
    }
    return { id: assignment.id };
  });

/** Nobody pays for a sitting in which a check could not be opened a first time by the rule. */
async function refuseExposed(
  technician: Addressed,
  { employerId, moduleId, frontMatter, checks }: Release,
  { now, today }: { now: Date; today: string },
  transaction: Transaction,
): Promise<void> {
  const opened = await openedCases({ technicianId: technician.id, employerId }, now, transaction);
  for (const { id, kind, title } of checks) {
    const from = exposedUntil({ id, kind, moduleId }, opened, frontMatter.sitting, today);
    if (!from) continue;
    const message = `${technician.name} has had enough cases of "${title}". ${exposureReason(frontMatter.sitting, from)} Wait until then, or say why you assign it all the same.`;
    throw new InvalidError(message, { exposureNote: [`Say why, or assign it from ${from} on.`] });
  }
}

const HOLDERS = (role: string) => `
  SELECT p.id, p.name, p.email FROM people p JOIN role_grants g ON g.person_id = p.id
  WHERE g.employer_id = :employerId AND g.role = '${role}' AND g.ended_at IS NULL`;
// Locked, so that two leads cannot assign the same module to the same person at once.
const TECHNICIAN = `${HOLDERS("technician")} AND p.id::text = :technicianId FOR UPDATE OF g`;
const ADMINISTRATORS = HOLDERS("administrator");
const OPEN_ASSIGNMENT = `
  SELECT a.id FROM assignments a JOIN releases r ON r.id = a.release_id
  LEFT JOIN sittings s ON s.assignment_id = a.id LEFT JOIN decisions d ON d.sitting_id = s.id
  WHERE a.technician_id::text = :technicianId AND r.module_id = :moduleId AND d.id IS NULL`;
