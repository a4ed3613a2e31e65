import "server-only";
import { select } from "@/lib/db";
import { iso, isId } from "./findOwn";

/** `fault` is the reference of what went wrong when it could not be signed. */
export type PublicVerificationRecord = { id: string; number: string; signed: boolean; fault: string | null };

/** Public: how far the record of a verification is, for whoever knows its id. */
export async function getPublicVerificationRecord(id: string): Promise<PublicVerificationRecord | null> {
  if (!isId(id)) return null;
  const [row] = await select<PublicVerificationRecord>(STATE, { id });
  return row ?? null;
}

/** Public: the signed file; null while there is none. */
export async function getPublicVerificationFile(id: string) {
  if (!isId(id)) return null;
  const [row] = await select<{ number: string; pdf: Buffer; signedAt: Date }>(FILE, { id });
  return row ? { number: row.number, pdf: row.pdf, signedAt: iso(row.signedAt) } : null;
}

const STATE = `
  SELECT v.id, c.number, v.pdf IS NOT NULL AS signed, p.fault
  FROM verifications v JOIN certificates c ON c.id = v.certificate_id
  LEFT JOIN progress p ON p.subject_id = v.id AND p.job = 'sign-verification' WHERE v.id = :id`;
const FILE = `
  SELECT c.number, v.pdf, v.signed_at AS "signedAt"
  FROM verifications v JOIN certificates c ON c.id = v.certificate_id WHERE v.id = :id AND v.pdf IS NOT NULL`;
