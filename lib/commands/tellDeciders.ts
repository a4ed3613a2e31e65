import "server-only";
import type { Transaction } from "sequelize";
import { dayIn } from "@/lib/calendar";
import { select } from "@/lib/db";
import { barsToDeciding } from "@/lib/policies/separation";
import { separationFacts } from "@/lib/queries/separationFacts";
import { Person } from "@/models";
import type { FoundCase } from "./findCase";
import { writeMail } from "./writeMail";

type Decider = { personId: string; email: string };

const COMPLETE = "It is complete: every check has its marking record.";

/**
 * A sitting is there to be decided: a mail to every decider of the employer whom nothing bars from deciding on it.
 * @param why a sentence for the mail; that it is complete, when left out
 */
export async function tellDeciders(
  { sitting, release, employer }: Pick<FoundCase, "sitting" | "release" | "employer">,
  { publicOrigin, now, why = COMPLETE }: { publicOrigin: string; now: Date; why?: string },
  transaction: Transaction,
): Promise<void> {
  const technician = await Person.findByPk(sitting.technicianId, { transaction, rejectOnEmpty: true });
  const today = dayIn(employer.timeZone, now);
  for (const { personId, email } of await select<Decider>(DECIDERS, { employerId: employer.id }, transaction)) {
    if (barsToDeciding(await separationFacts({ personId }, sitting, today, transaction)).length) continue;
    const subject = `For decision: ${technician.name}, ${release.title}`;
    const body = `Sitting S-${sitting.number} of ${technician.name} on "${release.title}", release ${release.number}, is there to be decided. ${why}\nYou sign in again to sign.\n\n${publicOrigin}/${employer.slug}/queue/${sitting.id}\n`;
    await writeMail({ to: email, subject, body }, transaction);
  }
}

const DECIDERS = `
  SELECT p.id AS "personId", p.email FROM people p JOIN role_grants g ON g.person_id = p.id
  WHERE g.employer_id = :employerId AND g.role = 'decider' AND g.ended_at IS NULL ORDER BY p.email`;
