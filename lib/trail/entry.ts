import { fingerprintOf } from "@/lib/certificates/canonicalJson";

/** One act, as the chain knows it: ids, codes and hashes, never a name or free text. Every value is text or null. */
export type TrailEntry = {
  id: string;
  /** UTC with microseconds: as exact as PostgreSQL keeps it, so that no digit can change unseen. */
  at: string;
  act: string;
  actorId: string | null;
  employerId: string | null;
  subjectTable: string;
  subjectKey: string;
  rowSha256: string;
};

/** SELECT list that reads a TrailEntry from `trail_entries e`. */
export const ENTRY_COLUMNS = `
  e.id::text AS "id", to_char(e.at AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"') AS "at", e.act AS "act",
  e.actor_id::text AS "actorId", e.employer_id::text AS "employerId",
  e.subject_table AS "subjectTable", e.subject_key AS "subjectKey", e.row_sha256 AS "rowSha256"`;

/** SHA-256 of the entry's canonical JSON (RFC 8785); listed field by field, so that a joined column never enters. */
export const entrySha256 = (entry: TrailEntry): string =>
  fingerprintOf({
    id: entry.id,
    at: entry.at,
    act: entry.act,
    actorId: entry.actorId,
    employerId: entry.employerId,
    subjectTable: entry.subjectTable,
    subjectKey: entry.subjectKey,
    rowSha256: entry.rowSha256,
  });
