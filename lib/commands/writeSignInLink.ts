import "server-only";
import { randomBytes } from "node:crypto";
import type { Transaction } from "sequelize";
import { db } from "@/lib/db";
import { webEnv } from "@/lib/env";
import { hashLinkToken } from "./hashLinkToken";

type Link = { email: string; back?: string | null; expiresAt: Date };

/**
 * Store a link that signs this address in, once, and give its address for the mail. Only the token's hash is stored:
 * whoever reads the table cannot sign in with it.
 */
export async function writeSignInLink({ email, back, expiresAt }: Link, now: Date, transaction: Transaction) {
  const token = randomBytes(32).toString("base64url");
  const replacements = { tokenHash: hashLinkToken(token), email, expiresAt, now };
  await db.query(FORGET_EXPIRED, { replacements, transaction });
  await db.query(STORE, { replacements, transaction });
  const query = new URLSearchParams({ email, token, ...(back && { back }) });
  // A page with a key to press: mail scanners follow links, and one that worked at once would be used up by them.
  return `${webEnv().PUBLIC_ORIGIN}/sign-in/link?${query}`;
}

const FORGET_EXPIRED = "DELETE FROM sign_in_links WHERE expires_at < :now";
const STORE = "INSERT INTO sign_in_links (token_hash, email, expires_at) VALUES (:tokenHash, :email, :expiresAt)";
