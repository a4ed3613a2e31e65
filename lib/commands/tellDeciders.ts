import "server-only";
import type { Transaction } from "sequelize";
import { Person } from "@/models";
import type { FoundCase } from "./findCase";
import { freeDeciders } from "./freeDeciders";
import { writeMail } from "./writeMail";

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
  for (const to of await freeDeciders({ sitting, employer }, now, transaction)) {
    const subject = `For decision: ${technician.name}, ${release.title}`;
    const body = `Sitting S-${sitting.number} of ${technician.name} on "${release.title}", release ${release.number}, is there to be decided. ${why}\nYou sign in again to sign.\n\n${publicOrigin}/${employer.slug}/queue/${sitting.id}\n`;
    await writeMail({ to, subject, body }, transaction);
  }
}
