import "server-only";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { Answers, CheckPlan } from "@/lib/checks/kind";
import { kindOf } from "@/lib/checks/registry";
import { judgeLines, type Verdict } from "@/lib/checks/written/judgeLines";
import type { WrittenParameters } from "@/lib/checks/written/parameters";
import { webEnv } from "@/lib/env";
import { ConflictError, InvalidError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { HandIn, MarkingRecord } from "@/models";
import { findCase } from "./findCase";
import { lockOwnCase, lockOwnSitting } from "./lockOwn";
import { tellMarked } from "./tellMarked";
import { transact } from "./transact";

type Judged = { caseId: string; verdicts: readonly Verdict[] };

/** An assessor judges a written hand-in line by line; that is its marking record. Judged twice, the first one stays. */
export const judgeWritten = (actor: Actor, { caseId, verdicts }: Judged, now = new Date()) =>
  transact(actor, async (transaction) => {
    const { case: found, sitting } = await lockOwnCase(actor, caseId, transaction);
    authorize(can.judge(actor, sitting), "judge this case");
    if (!kindOf(found.kind, found.kindVersion).judged) throw new ConflictError("The server marks this case.");
    // The lock that every marking takes: so the last of two checks sees that the other is marked.
    await lockOwnSitting(actor, sitting.id, transaction);
    const earlier = await MarkingRecord.findOne({ where: { caseId }, transaction });
    if (earlier?.judgedBy === actor.personId) return { id: earlier.id };
    if (earlier) throw new ConflictError("Another assessor has judged this case already.");
    const handIn = await HandIn.findByPk(caseId, { transaction });
    if (!handIn) throw new ConflictError("This case is not handed in yet.");
    const context = await findCase(caseId, transaction);
    const marking = markingOf(context.plan, handIn.answers, verdicts);
    const { id } = await MarkingRecord.create(
      {
        caseId,
        sequence: 1,
        engineVersion: ENGINE_VERSION,
        durationMs: 0,
        markedAt: now,
        judgedBy: actor.personId,
        ...marking,
      },
      { transaction },
    );
    const publicOrigin = webEnv().PUBLIC_ORIGIN;
    await tellMarked(context, { byClock: handIn.byClock, publicOrigin, now }, transaction);
    return { id };
  });

function markingOf(plan: CheckPlan, answers: Answers, verdicts: readonly Verdict[]) {
  const reasonless = verdicts.find(({ within, reason }) => !within && reason.trim() === "");
  if (reasonless) throw new InvalidError("Give a reason for every line that is outside.");
  try {
    return judgeLines(plan as CheckPlan<WrittenParameters>, answers, verdicts);
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    throw new InvalidError("Judge every line of this case, each once.");
  }
}
