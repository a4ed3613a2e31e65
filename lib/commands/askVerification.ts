import "server-only";
import { select } from "@/lib/db";
import { enqueue } from "@/lib/jobs/enqueue";
import { transact } from "./transact";

type Asked = { number: string; fileSha256: string | null };

/**
 * Anybody may ask for a record of a verification. The worker, who has the issuer's key, reads the register for it again
 * and signs: nothing that this process says of the certificate gets into the file.
 * @returns the id to fetch it by, which nobody can guess; null when the register has no such number
 */
export const askVerification = ({ number, fileSha256 }: Asked, now = new Date()): Promise<string | null> =>
  transact(null, async (transaction) => {
    const [asked] = await select<{ id: string }>(ASK, { number, fileSha256, now }, transaction);
    if (!asked) return null;
    await enqueue("sign-verification", { verificationId: asked.id }, transaction);
    return asked.id;
  });

const ASK = `
  INSERT INTO verifications (certificate_id, file_sha256, asked_at)
  SELECT id, :fileSha256, :now FROM certificates WHERE number = :number RETURNING id`;
