import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { iso, isoOrNull } from "./findOwn";

type Row = {
  id: string;
  code: string;
  title: string;
  savedAt: Date;
  number: string | null;
  fingerprint: string | null;
  releasedAt: Date | null;
  changed: boolean;
  openSittings: number;
};

export type ModuleRow = Omit<Row, "savedAt" | "releasedAt"> & { savedAt: string; releasedAt: string | null };

/** The employer's modules, each with its last release and whether the draft has moved on since. */
export async function listModules(actor: Actor): Promise<ModuleRow[]> {
  authorize(can.readModules(actor, actor), "read the modules");
  const rows = await select<Row>(SQL, { employerId: actor.employerId });
  return rows.map((row) => ({ ...row, savedAt: iso(row.savedAt), releasedAt: isoOrNull(row.releasedAt) }));
}

const SQL = `
  SELECT m.id, m.code, d.title, d.saved_at AS "savedAt", r.number, r.fingerprint, r.released_at AS "releasedAt",
    (r.source IS NULL OR r.source <> d.source) AS changed,
    (SELECT count(*)::int FROM assignments a JOIN releases ar ON ar.id = a.release_id
       LEFT JOIN sittings s ON s.assignment_id = a.id LEFT JOIN decisions de ON de.sitting_id = s.id
     WHERE ar.module_id = m.id AND de.id IS NULL) AS "openSittings"
  FROM modules m JOIN drafts d ON d.module_id = m.id
  LEFT JOIN LATERAL (SELECT * FROM releases r WHERE r.module_id = m.id ORDER BY r.released_at DESC LIMIT 1) r ON true
  WHERE m.employer_id = :employerId ORDER BY m.code`;
