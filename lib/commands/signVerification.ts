import "server-only";
import { QueryTypes } from "sequelize";
import { drawVerification } from "@/lib/certificates/drawVerification";
import { signPdf } from "@/lib/certificates/signPdf";
import { db, select } from "@/lib/db";
import { getPublicVerification } from "@/lib/queries/getPublicVerification";
import type { IssueTools } from "./issueCertificate";

const KEPT_MS = 86_400_000;
const REASON = "Record of a verification, read from the register";

/** Read the register and sign what it says, for whoever asked. Run twice, the first record stays. */
export async function signVerification(
  verificationId: string,
  tools: Pick<IssueTools, "issuerKey" | "publicOrigin">,
  now = () => new Date(),
): Promise<"signed" | "was signed" | "is gone"> {
  await db.query(FORGET, { replacements: { before: new Date(now().getTime() - KEPT_MS) }, type: QueryTypes.DELETE });
  const [asked] = await select<Asked>(ASKED, { verificationId });
  if (!asked) return "is gone";
  if (asked.signed) return "was signed";
  const signedAt = now();
  const entry = await getPublicVerification(asked.number, signedAt);
  if (!entry) throw new Error(`signVerification: the register lost ${asked.number}`);
  const file = asked.fileSha256 && { sha256: asked.fileSha256, agrees: asked.fileSha256 === entry.pdfSha256 };
  const drawn = await drawVerification({ entry, origin: tools.publicOrigin, file: file || null });
  const pdf = Buffer.from(await signPdf(drawn, tools.issuerKey, signedAt, REASON));
  await db.query(KEEP, { bind: [verificationId, pdf, signedAt], type: QueryTypes.UPDATE });
  return "signed";
}

type Asked = { number: string; fileSha256: string | null; signed: boolean };
const ASKED = `
  SELECT c.number, v.file_sha256 AS "fileSha256", v.pdf IS NOT NULL AS signed
  FROM verifications v JOIN certificates c ON c.id = v.certificate_id WHERE v.id = :verificationId`;
const KEEP = `UPDATE verifications SET pdf = $2, signed_at = $3 WHERE id = $1 AND pdf IS NULL`;
const FORGET = `DELETE FROM verifications WHERE asked_at < :before`;
