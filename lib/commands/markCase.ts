import "server-only";
import type { Transaction } from "sequelize";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { Marking } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import type { DecidableCase } from "@/lib/policies/decidability";
import { isSittingComplete } from "@/lib/policies/isSittingComplete";
import { CaseSecret, HandIn, MarkingRecord, Person, Progress, Sitting } from "@/models";
import { openSecret } from "./caseSecret";
import type { Engine } from "./engine";
import { findCase, type FoundCase } from "./findCase";
import { plainTruth } from "./plainTruth";
import { tellDeciders } from "./tellDeciders";
import { transact } from "./transact";
import { writeMail } from "./writeMail";

export type MarkTools = { engine: Engine; seedKey: string; publicOrigin: string };

/** The engine of this process does not re-create the case that was drawn, so it cannot mark it. */
export class EngineDiffersError extends Error {
  override name = "EngineDiffersError";
}

/** Mark what was handed in against the truth worked out again from the seed. Run twice, the first record stays. */
export async function markCase(
  caseId: string,
  tools: MarkTools,
  now = () => new Date(),
): Promise<"marked" | "was marked"> {
  const context = await findCase(caseId);
  const handIn = await HandIn.findByPk(caseId, { rejectOnEmpty: true });
  if (await MarkingRecord.count({ where: { caseId } })) return "was marked";
  const secret = await CaseSecret.findByPk(caseId, { rejectOnEmpty: true });
  const { seedHex } = openSecret(secret.sealed, caseId, tools.seedKey);
  const started = performance.now();
  const { truth, marking } = await tools.engine.mark(seedHex, context.plan, handIn.answers);
  if (fingerprintOf(plainTruth(truth)) !== secret.truthSha256) {
    const versions = `drawn by engine ${secret.engineVersion}, this one is ${ENGINE_VERSION}`;
    throw new EngineDiffersError(`markCase: case ${caseId} is not re-created: ${versions}`);
  }
  const durationMs = Math.round(performance.now() - started);
  return transact({ personId: "", employerId: context.sitting.employerId }, async (transaction) => {
    // Whatever depends on the state of a sitting takes this lock; so two checks marked at once see each other.
    await Sitting.findByPk(context.sitting.id, { transaction, lock: transaction.LOCK.UPDATE });
    if (await MarkingRecord.count({ where: { caseId }, transaction })) return "was marked";
    const record = { caseId, sequence: 1, engineVersion: ENGINE_VERSION, durationMs, markedAt: now() };
    await MarkingRecord.create({ ...record, ...fields(marking) }, { transaction });
    await Progress.destroy({ where: { subjectId: caseId, job: "mark-case" }, transaction });
    await tellTechnician(context, handIn.byClock, tools.publicOrigin, transaction);
    if (await runsOut(context, transaction)) {
      await tellDeciders(context, { publicOrigin: tools.publicOrigin, now: now() }, transaction);
    }
    return "marked";
  });
}

const fields = ({ marking, rows, quantities, withinCount, needs, met, workings }: Marking) => ({
  ...{ marking, rows, quantities, withinCount, needs, met, workings },
});

// True once in a sitting: afterwards no case can be opened in it, so none is marked.
async function runsOut({ sitting, release }: FoundCase, transaction: Transaction): Promise<boolean> {
  const cases = await select<DecidableCase & { number: number }>(CASES, { sittingId: sitting.id }, transaction);
  return isSittingComplete(release.checks, release.frontMatter.sitting, cases);
}

async function tellTechnician(
  { found, sitting, release, employer, plan }: FoundCase,
  byClock: boolean,
  publicOrigin: string,
  transaction: Transaction,
): Promise<void> {
  const technician = await Person.findByPk(sitting.technicianId, { transaction, rejectOnEmpty: true });
  // The outcome is not in the mail: it is read with its reasons.
  const how = byClock ? " Its time had run out, so what you had saved was handed in." : "";
  const body = `Case ${found.number} of the check "${plan.title}" (${release.title}, sitting S-${sitting.number}) is marked.${how}\nThe whole marking record, with the computed values and workings:\n\n${publicOrigin}/${employer.slug}/records/${found.id}\n`;
  await writeMail({ to: technician.email, subject: `Marked: ${plan.title}`, body }, transaction);
}

const CASES = `SELECT check_id AS "checkId", number, state, met FROM case_states WHERE sitting_id = :sittingId`;
