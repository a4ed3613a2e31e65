import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { can } from "@/lib/policies/can";
import { storage } from "@/lib/storage/storage";
import { isId } from "./findOwn";

type Row = {
  storageKey: string;
  mediaType: string;
  sha256: string;
  employerId: string;
  technicianId: string;
  handedIn: boolean;
};

/** A file of the case, for the person who sits and, once it is handed in, whoever may read the record. */
export async function getCaseFile(actor: Actor, caseId: string, name: string) {
  if (!isId(caseId)) return null;
  const [row] = await select<Row>(SQL, { caseId, name, employerId: actor.employerId });
  if (!row || !(can.sit(actor, row) || (row.handedIn && can.readRecord(actor, row)))) return null;
  const bytes = await storage().get(row.storageKey);
  return bytes && { bytes, mediaType: row.mediaType, sha256: row.sha256 };
}

const SQL = `
  SELECT f.storage_key AS "storageKey", f.media_type AS "mediaType", f.sha256, s.employer_id AS "employerId",
    s.technician_id AS "technicianId", EXISTS (SELECT 1 FROM hand_ins h WHERE h.case_id = x.id) AS "handedIn"
  FROM captures f JOIN cases x ON x.id = f.case_id JOIN sittings s ON s.id = x.sitting_id
  WHERE f.case_id = :caseId AND f.name = :name AND s.employer_id = :employerId`;
