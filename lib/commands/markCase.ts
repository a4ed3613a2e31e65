import "server-only";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { Marking } from "@/lib/checks/kind";
import { CaseSecret, HandIn, MarkingRecord, Progress, Sitting } from "@/models";
import { openSecret } from "./caseSecret";
import type { Engine } from "./engine";
import { findCase } from "./findCase";
import { plainTruth } from "./plainTruth";
import { tellMarked } from "./tellMarked";
import { transact } from "./transact";

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
    const told = { byClock: handIn.byClock, publicOrigin: tools.publicOrigin, now: now() };
    await tellMarked(context, told, transaction);
    return "marked";
  });
}

const fields = ({ marking, rows, quantities, withinCount, needs, met, workings }: Marking) => ({
  ...{ marking, rows, quantities, withinCount, needs, met, workings },
});
