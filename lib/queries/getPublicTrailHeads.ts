import "server-only";
import type { JWK } from "jose";
import { select } from "@/lib/db";
import { publicJwk } from "@/lib/trail/head";
import { issuerCertificates } from "./issuerCertificates";

/** `signature` is a compact JWS over sequence, link and instant; it alone is worth keeping. */
export type PublicTrailHead = { sequence: string; link: string; at: string; signature: string };
export type PublicTrailHeads = { newest: PublicTrailHead | null; daily: PublicTrailHead[]; key: JWK };

/** Public: the newest signed head of the trail and the last one of each of the last sixty days (UTC), newest first. */
export async function getPublicTrailHeads(): Promise<PublicTrailHeads> {
  const daily = await select<PublicTrailHead>(LAST_OF_EACH_DAY);
  const [newest] = await select<PublicTrailHead>(NEWEST);
  const { certificatePem } = await issuerCertificates();
  return { newest: newest ?? null, daily, key: publicJwk(certificatePem) };
}

const HEAD = `sequence::text AS "sequence", link_sha256 AS "link", signature AS "signature",
  to_char(signed_at AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"') AS "at"`;
const NEWEST = `SELECT ${HEAD} FROM trail_heads ORDER BY trail_heads.sequence DESC LIMIT 1`;
const LAST_OF_EACH_DAY = `
  SELECT DISTINCT ON ((signed_at AT TIME ZONE 'UTC')::date) ${HEAD} FROM trail_heads
  WHERE signed_at > now() - interval '60 days'
  ORDER BY (signed_at AT TIME ZONE 'UTC')::date DESC, trail_heads.sequence DESC`;
