import "server-only";
import type { Transaction } from "sequelize";
import { kindOf } from "@/lib/checks/registry";
import { select } from "@/lib/db";
import type { DecidableCase } from "@/lib/policies/decidability";
import { isSittingComplete } from "@/lib/policies/isSittingComplete";
import { Person } from "@/models";
import type { FoundCase } from "./findCase";
import { tellDeciders } from "./tellDeciders";
import { writeMail } from "./writeMail";

type Told = { byClock: boolean; publicOrigin: string; now: Date };

/** A case has its marking record: a mail to who sat it and, when it was the sitting's last, to the deciders. */
export async function tellMarked(context: FoundCase, told: Told, transaction: Transaction): Promise<void> {
  await tellTechnician(context, told, transaction);
  if (await runsOut(context, transaction)) await tellDeciders(context, told, transaction);
}

// True once in a sitting: afterwards no case can be opened in it, so none is marked.
async function runsOut({ sitting, release }: FoundCase, transaction: Transaction): Promise<boolean> {
  const cases = await select<DecidableCase & { number: number }>(CASES, { sittingId: sitting.id }, transaction);
  return isSittingComplete(release.checks, release.frontMatter.sitting, cases);
}

async function tellTechnician(
  { found, sitting, release, employer, plan }: FoundCase,
  { byClock, publicOrigin }: Told,
  transaction: Transaction,
): Promise<void> {
  const technician = await Person.findByPk(sitting.technicianId, { transaction, rejectOnEmpty: true });
  // The outcome is not in the mail: it is read with its reasons.
  const how = byClock ? " Its time had run out, so what you had saved was handed in." : "";
  const within = kindOf(found.kind, found.kindVersion).judged
    ? "with each line's verdict and its reason"
    : "with the computed values and workings";
  const body = `Case ${found.number} of the check "${plan.title}" (${release.title}, sitting S-${sitting.number}) is marked.${how}\nThe whole marking record, ${within}:\n\n${publicOrigin}/${employer.slug}/records/${found.id}\n`;
  await writeMail({ to: technician.email, subject: `Marked: ${plan.title}`, body }, transaction);
}

const CASES = `SELECT check_id AS "checkId", number, state, met FROM case_states WHERE sitting_id = :sittingId`;
