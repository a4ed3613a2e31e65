import "server-only";
import { select } from "@/lib/db";
import { transact } from "./transact";

type Taken = { email: string; expiresAt: Date };

/** Use a link up. Null when there is none: never written, of another address, or used before. */
export const takeSignInLink = (email: string, tokenHash: string): Promise<Taken | null> =>
  transact(null, async (transaction) => {
    // Deleting decides who was first when a link is followed twice at once.
    const [taken] = await select<Taken>(TAKE, { email, tokenHash }, transaction);
    return taken ?? null;
  });

const TAKE = `
  DELETE FROM sign_in_links WHERE token_hash = :tokenHash AND email = :email
  RETURNING email, expires_at AS "expiresAt"`;
