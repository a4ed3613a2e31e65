import "server-only";
import type { Transaction } from "sequelize";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import type { SeparationFacts } from "@/lib/policies/separation";
import { Assignment, type Sitting } from "@/models";

/** Everything that could bar a person from deciding on a sitting; read inside the deciding transaction, too. */
export async function separationFacts(
  actor: Pick<Actor, "personId">,
  sitting: Sitting,
  today: string,
  transaction?: Transaction,
): Promise<SeparationFacts> {
  const { releaseId, technicianId } = sitting;
  const assignment = await Assignment.findByPk(sitting.assignmentId, { transaction, rejectOnEmpty: true });
  return {
    deciderId: actor.personId,
    technicianId,
    assignedById: assignment.assignedBy,
    releaseHands: await select(HANDS, { releaseId }, transaction),
    trainings: await select(TRAININGS, { technicianId }, transaction),
    judgedByIds: (await select<{ id: string }>(JUDGES, { sittingId: sitting.id }, transaction)).map(({ id }) => id),
    today,
  };
}

const HANDS = `SELECT person_id AS "personId", part FROM release_writers WHERE release_id = :releaseId`;
const JUDGES = `
  SELECT DISTINCT k.judged_by AS id FROM marking_records k JOIN cases x ON x.id = k.case_id
  WHERE x.sitting_id = :sittingId AND k.judged_by IS NOT NULL`;
const TRAININGS = `SELECT trainer_id AS "trainerId", ended_on::text AS "endedOn" FROM trainings WHERE technician_id = :technicianId`;
