import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { iso } from "./findOwn";

type Row = {
  id: string;
  at: Date;
  act: string;
  actor: string | null;
  subjectTable: string;
  subjectKey: string;
  rowSha256: string;
  sequence: string | null;
  linkSha256: string | null;
};
export type TrailRow = Omit<Row, "at"> & { at: string };

/** The employer's part of the trail, newest first, a page of 100 at a time. */
export async function listTrail(actor: Actor, before: string | null): Promise<TrailRow[]> {
  authorize(can.readTrail(actor, actor), "read the trail");
  const last = before && /^\d{1,18}$/.test(before) ? before : null;
  const rows = await select<Row>(SQL, { employerId: actor.employerId, last });
  return rows.map((row) => ({ ...row, at: iso(row.at) }));
}

const SQL = `
  SELECT t.id::text AS id, t.at, t.act, p.name AS actor, t.subject_table AS "subjectTable", t.subject_key AS "subjectKey",
    t.row_sha256 AS "rowSha256", l.sequence::text AS sequence, l.link_sha256 AS "linkSha256"
  FROM trail_entries t LEFT JOIN people p ON p.id = t.actor_id LEFT JOIN trail_links l ON l.entry_id = t.id
  WHERE t.employer_id = :employerId AND (:last::bigint IS NULL OR t.id < :last::bigint) ORDER BY t.id DESC LIMIT 100`;
