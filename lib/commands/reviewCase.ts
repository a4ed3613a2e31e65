import "server-only";
import { changedRows } from "@/lib/checks/changedRows";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import { MarkingRecord, MarkingReview, Progress, ReviewFinding } from "@/models";
import { computeMarking } from "./computeMarking";
import { findCase } from "./findCase";
import type { MarkTools } from "./markCase";
import { transact } from "./transact";

type Reviewed = { reviewId: string; caseId: string };

/** What a corrected marking makes of one case, beside its newest record. No record is added. Run twice, the first finding stays. */
export async function reviewCase(
  { reviewId, caseId }: Reviewed,
  tools: Omit<MarkTools, "publicOrigin">,
  now = () => new Date(),
): Promise<"reviewed" | "was reviewed"> {
  if (await ReviewFinding.count({ where: { reviewId, caseId } })) return "was reviewed";
  const review = await MarkingReview.findByPk(reviewId, { rejectOnEmpty: true });
  const context = await findCase(caseId);
  const record = await MarkingRecord.findOne({
    where: { caseId },
    order: [["sequence", "DESC"]],
    rejectOnEmpty: true,
  });
  const { marking, durationMs } = await computeMarking(context, tools);
  // A worker of before the correction, or of after the next one, would find something else.
  if (marking.marking !== review.marking)
    throw new Error(`reviewCase: asked for ${review.marking}, this engine marks by ${marking.marking}`);
  return transact({ personId: "", employerId: review.employerId }, async (transaction) => {
    const found = {
      ...{ reviewId, caseId, recordId: record.id, metBefore: record.met, met: marking.met, marking },
      ...{ changedRows: changedRows(record.rows, marking.rows), engineVersion: ENGINE_VERSION, durationMs },
      foundAt: now(),
    };
    await ReviewFinding.bulkCreate([found], { ignoreDuplicates: true, transaction });
    await Progress.destroy({ where: { subjectId: caseId, job: "review-case" }, transaction });
    return "reviewed" as const;
  });
}
