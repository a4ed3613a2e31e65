import "server-only";
import type { Answers } from "@/lib/checks/kind";
import { webEnv } from "@/lib/env";
import { ConflictError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { CaseView, HandIn } from "@/models";
import { lockOwnCase } from "./lockOwn";
import { GRACE_MS } from "./saveAnswers";
import { sendForMarking } from "./sendForMarking";
import { transact } from "./transact";

type Handed = { caseId: string; answers: Answers; words: string };

/** Hand a case in for good. Server time counts; handing in twice gives the first hand-in. */
export const handIn = (actor: Actor, { caseId, answers, words }: Handed, now = new Date()) =>
  transact(actor, async (transaction) => {
    const handed = await lockOwnCase(actor, caseId, transaction);
    authorize(can.sit(actor, handed.sitting), "hand in this case");
    const earlier = await HandIn.findByPk(caseId, { transaction });
    if (earlier) return { handedInAt: earlier.handedInAt.toISOString() };
    const view = await CaseView.findByPk(caseId, { attributes: ["endsAt"], transaction });
    if (!view) throw new ConflictError("This case is not drawn yet.");
    if (now.getTime() > view.endsAt.getTime() + GRACE_MS) {
      throw new ConflictError("The time of this case is over. What was saved is handed in by the clock.");
    }
    await HandIn.create({ caseId, answers, words, byClock: false, handedInAt: now }, { transaction });
    await sendForMarking(handed, webEnv().PUBLIC_ORIGIN, transaction);
    return { handedInAt: now.toISOString() };
  });
