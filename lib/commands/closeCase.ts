import "server-only";
import { enqueue } from "@/lib/jobs/enqueue";
import { Case, CaseAnswers, CaseView, HandIn, Sitting } from "@/models";
import { GRACE_MS } from "./saveAnswers";
import { sendForMarking } from "./sendForMarking";
import { transact } from "./transact";

/** The clock has run out: hand in what was saved, if the technician did not. Answers on their way get the same grace as a save. */
export async function closeCase(
  caseId: string,
  publicOrigin: string,
  now = new Date(),
): Promise<"closed" | "was handed in" | "still open"> {
  const found = await Case.findByPk(caseId, { rejectOnEmpty: true });
  const sitting = await Sitting.findByPk(found.sittingId, { rejectOnEmpty: true });
  return transact({ personId: "", employerId: sitting.employerId }, async (transaction) => {
    // The same row that saving and handing in lock.
    await Case.findByPk(caseId, { transaction, lock: transaction.LOCK.UPDATE });
    if (await HandIn.count({ where: { caseId }, transaction })) return "was handed in";
    const view = await CaseView.findByPk(caseId, { attributes: ["endsAt"], transaction, rejectOnEmpty: true });
    const closesAt = new Date(view.endsAt.getTime() + GRACE_MS);
    if (now < closesAt) {
      await enqueue("close-case", { caseId }, transaction, closesAt);
      return "still open";
    }
    const saved = await CaseAnswers.findByPk(caseId, { transaction });
    const answers = saved?.answers ?? {};
    await HandIn.create({ caseId, answers, byClock: true, handedInAt: view.endsAt }, { transaction });
    await sendForMarking({ case: found, sitting }, publicOrigin, transaction);
    return "closed";
  });
}
