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

/** A sitting has run its course: a mail to every decider of the employer whom nothing bars from deciding on it. */
export async function tellDeciders(
  { sitting, release, employer }: Pick<FoundCase, "sitting" | "release" | "employer">,
  { publicOrigin, now }: { publicOrigin: string; now: Date },
  transaction: Transaction,
): Promise<void> {
  const technician = await Person.findByPk(sitting.technicianId, { transaction, rejectOnEmpty: true });
  const today = dayIn(employer.timeZone, now);
  for (const { personId, email } of await select<Decider>(DECIDERS, { employerId: employer.id }, transaction)) {
    if (barsToDeciding(await separationFacts({ personId }, sitting, today, transaction)).length) continue;
    const subject = `For decision: ${technician.name}, ${release.title}`;
    const body = `Sitting S-${sitting.number} of ${technician.name} on "${release.title}", release ${release.number}, has run its course: every check has its marking record.\nYou sign in again to sign.\n\n${publicOrigin}/${employer.slug}/queue/${sitting.id}\n`;
    await writeMail({ to: email, subject, body }, transaction);
  }
}

const DECIDERS = `
  SELECT p.id AS "personId", p.email FROM people p JOIN role_grants g ON g.person_id = p.id
  WHERE g.employer_id = :employerId AND g.role = 'decider' AND g.ended_at IS NULL ORDER BY p.email`;
