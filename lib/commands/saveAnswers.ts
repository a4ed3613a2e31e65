import "server-only";
import { QueryTypes } from "sequelize";
import type { Answers } from "@/lib/checks/kind";
import { db } from "@/lib/db";
import { ConflictError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { CaseView, HandIn } from "@/models";
import { lockOwnCase } from "./lockOwn";
import { transact } from "./transact";

/** Answers sent in the last second of the clock are still on their way when it ends. */
export const GRACE_MS = 30_000;

type Save = { caseId: string; answers: Answers; revision: number };

/**
 * Keep the answers of an open case as they stand on the technician's screen.
 * @param revision counts up on the screen; an older save that arrives late changes nothing
 */
export const saveAnswers = (actor: Actor, { caseId, answers, revision }: Save, now = new Date()) =>
  transact(actor, async (transaction) => {
    const { sitting } = await lockOwnCase(actor, caseId, transaction);
    authorize(can.sit(actor, sitting), "answer this case");
    if (await HandIn.count({ where: { caseId }, transaction })) throw new ConflictError("This case is handed in.");
    const view = await CaseView.findByPk(caseId, { attributes: ["endsAt"], transaction });
    if (!view) throw new ConflictError("This case is not drawn yet.");
    if (now.getTime() > view.endsAt.getTime() + GRACE_MS) throw new ConflictError("The time of this case is over.");
    const replacements = { caseId, answers: JSON.stringify(answers), revision, now };
    await db.query(KEEP, { replacements, transaction, type: QueryTypes.INSERT });
    return { savedAt: now.toISOString() };
  });

const KEEP = `
  INSERT INTO case_answers (case_id, answers, revision, saved_at) VALUES (:caseId, :answers, :revision, :now)
  ON CONFLICT (case_id) DO UPDATE SET answers = excluded.answers, revision = excluded.revision, saved_at = excluded.saved_at
  WHERE case_answers.revision < excluded.revision`;
