import "server-only";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import { MarkingRecord, Progress, Sitting } from "@/models";
import { computeMarking, markingColumns } from "./computeMarking";
import type { Engine } from "./engine";
import { findCase } from "./findCase";
import { tellMarked } from "./tellMarked";
import { transact } from "./transact";

export type MarkTools = { engine: Engine; seedKey: string; publicOrigin: string };

/** Mark what was handed in against the truth worked out again from the seed. Run twice, the first record stays. */
export async function markCase(
  caseId: string,
  tools: MarkTools,
  now = () => new Date(),
): Promise<"marked" | "was marked"> {
  const context = await findCase(caseId);
  if (await MarkingRecord.count({ where: { caseId } })) return "was marked";
  const { marking, handIn, durationMs } = await computeMarking(context, tools);
  return transact({ personId: "", employerId: context.sitting.employerId }, async (transaction) => {
    // Whatever depends on the state of a sitting takes this lock; so two checks marked at once see each other.
    await Sitting.findByPk(context.sitting.id, { transaction, lock: transaction.LOCK.UPDATE });
    if (await MarkingRecord.count({ where: { caseId }, transaction })) return "was marked";
    const record = { caseId, sequence: 1, engineVersion: ENGINE_VERSION, durationMs, markedAt: now() };
    await MarkingRecord.create({ ...record, ...markingColumns(marking) }, { transaction });
    await Progress.destroy({ where: { subjectId: caseId, job: "mark-case" }, transaction });
    const told = { byClock: handIn.byClock, publicOrigin: tools.publicOrigin, now: now() };
    await tellMarked(context, told, transaction);
    return "marked";
  });
}
