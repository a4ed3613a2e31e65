import "server-only";
import { select } from "@/lib/db";
import type { Actor, Role } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { canPeople } from "@/lib/policies/people";

export type HeldRole = { grantId: string; role: Role; outsideLine: boolean; grantedOn: string };
export type PersonView = { id: string; name: string; email: string; roles: HeldRole[] };
export type TrainingView = { id: string; technician: string; trainer: string; endedOn: string; recordedBy: string };
export type PeopleView = {
  /** By name; people whose last role has ended come last, with none. */
  people: PersonView[];
  trainings: TrainingView[];
  may: { add: boolean; grantRole: boolean; endRole: boolean; recordTraining: boolean };
};

/** Everybody who holds or held a role at the actor's employer. */
export async function listPeople(actor: Actor): Promise<PeopleView> {
  authorize(canPeople.read(actor), "see the people of the firm");
  const { employerId } = actor;
  return {
    people: await select<PersonView>(PEOPLE, { employerId }),
    trainings: await select<TrainingView>(TRAININGS, { employerId }),
    may: {
      add: canPeople.add(actor),
      grantRole: canPeople.grantRole(actor),
      endRole: canPeople.endRole(actor),
      recordTraining: canPeople.recordTraining(actor),
    },
  };
}

const PEOPLE = `
  SELECT p.id, p.name, p.email,
    coalesce(json_agg(json_build_object('grantId', g.id, 'role', g.role, 'outsideLine', g.outside_line,
      'grantedOn', to_char(g.granted_at AT TIME ZONE e.time_zone, 'YYYY-MM-DD')) ORDER BY g.role)
      FILTER (WHERE g.ended_at IS NULL), '[]') AS roles
  FROM role_grants g JOIN people p ON p.id = g.person_id JOIN employers e ON e.id = g.employer_id
  WHERE g.employer_id = :employerId
  GROUP BY p.id ORDER BY bool_and(g.ended_at IS NOT NULL), p.name, p.id`;
const TRAININGS = `
  SELECT t.id, c.name AS technician, w.name AS trainer, t.ended_on::text AS "endedOn", r.name AS "recordedBy"
  FROM trainings t JOIN people c ON c.id = t.technician_id JOIN people w ON w.id = t.trainer_id
  JOIN people r ON r.id = t.recorded_by
  WHERE t.employer_id = :employerId ORDER BY t.ended_on DESC, t.id`;
