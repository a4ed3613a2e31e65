import "server-only";
import { select } from "@/lib/db";
import { ForbiddenError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { isoOrNull } from "./findOwn";
import { SITTING_STATE, type SittingState } from "./sittingState";

type Row = {
  assignmentId: string;
  sittingId: string | null;
  number: string | null;
  technician: string;
  code: string;
  title: string;
  release: string;
  dueOn: string;
  lastDay: string | null;
  state: SittingState;
  checks: number;
  met: number;
  marked: number;
  certificate: string | null;
  startedAt: Date | null;
};
export type SittingRow = Omit<Row, "startedAt"> & { startedAt: string | null };

/** The technician's own assignments and sittings. */
export const listOwnSittings = (actor: Actor): Promise<SittingRow[]> =>
  list(`a.technician_id = :personId AND a.employer_id = :employerId`, actor);

/** All of the employer's, for the people who run them. */
export async function listSittings(actor: Actor): Promise<SittingRow[]> {
  if (!actor.roles.some((role) => role !== "technician"))
    throw new ForbiddenError("You may not read the firm's sittings.");
  return list(`a.employer_id = :employerId`, actor);
}

async function list(where: string, { personId, employerId }: Actor): Promise<SittingRow[]> {
  const rows = await select<Row>(
    `${SQL} WHERE ${where} ORDER BY coalesce(s.started_at, a.assigned_at) DESC LIMIT 500`,
    {
      personId,
      employerId,
    },
  );
  return rows.map((row) => ({ ...row, startedAt: isoOrNull(row.startedAt) }));
}

const SQL = `
  SELECT a.id AS "assignmentId", s.id AS "sittingId", s.number::text AS number, p.name AS technician, m.code, r.title,
    r.number AS release, a.due_on::text AS "dueOn", s.last_day::text AS "lastDay", s.started_at AS "startedAt",
    ${SITTING_STATE} AS state, jsonb_array_length(r.checks) AS checks, c.number AS certificate,
    (SELECT count(DISTINCT x.check_id)::int FROM case_states x WHERE x.sitting_id = s.id AND x.met) AS met,
    (SELECT count(DISTINCT x.check_id)::int FROM case_states x WHERE x.sitting_id = s.id AND x.state = 'marked') AS marked
  FROM assignments a JOIN releases r ON r.id = a.release_id JOIN modules m ON m.id = r.module_id
  JOIN people p ON p.id = a.technician_id JOIN fees f ON f.assignment_id = a.id
  LEFT JOIN sittings s ON s.assignment_id = a.id LEFT JOIN decisions d ON d.sitting_id = s.id
  LEFT JOIN certificates c ON c.sitting_id = s.id`;
