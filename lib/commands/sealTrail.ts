import "server-only";
import { db, select } from "@/lib/db";
import { ENTRY_COLUMNS, entrySha256, type TrailEntry } from "@/lib/trail/entry";
import { signHead } from "@/lib/trail/head";
import { linkSha256, NO_LINK } from "@/lib/trail/link";
import { transact } from "./transact";

/** Entries linked in one transaction: short enough that a stop loses a moment's work. */
export const SEAL_BATCH = 1000;

/**
 * Link the committed entries that wait, in order of their id, and sign the new end of the chain.
 * Acts never wait for it: they write their entry without a lock, and one sealer at a time links afterwards.
 * @returns how many were linked; SEAL_BATCH when more may wait, 0 also when another worker is sealing
 */
export const sealTrail = (issuerKeyPem: string, now = new Date()): Promise<number> =>
  transact(null, async (transaction) => {
    const [lock] = await select<{ got: boolean }>(TRY_LOCK, {}, transaction);
    if (!lock?.got) return 0;
    const entries = await select<TrailEntry>(WAITING, { most: SEAL_BATCH }, transaction);
    if (entries.length === 0) return 0;
    const [last] = await select<LastLink>(LAST_LINK, {}, transaction);
    const links = chain(entries, last ?? { sequence: "0", link: NO_LINK });
    const { sequence, link } = links.at(-1)!;
    const at = now.toISOString();
    const signature = await signHead({ sequence, link, at }, issuerKeyPem);
    await db.query(ADD_LINKS, { replacements: { links: JSON.stringify(links) }, transaction });
    await db.query(NO_LONGER_WAITING, { replacements: { ids: entries.map(({ id }) => id) }, transaction });
    await db.query(ADD_HEAD, { replacements: { sequence, link, at, signature }, transaction });
    return entries.length;
  });

type LastLink = { sequence: string; link: string };
type Link = LastLink & { entryId: string; entry: string };

function chain(entries: readonly TrailEntry[], last: LastLink): Link[] {
  let [sequence, link] = [BigInt(last.sequence), last.link];
  return entries.map((one) => {
    const entry = entrySha256(one);
    sequence += 1n;
    link = linkSha256(link, entry);
    return { sequence: String(sequence), entryId: one.id, entry, link };
  });
}

// Freed at the end of the transaction, also when the worker dies: 64 bits, "lagtrail" in ASCII.
const TRY_LOCK = `SELECT pg_try_advisory_xact_lock(x'6c6167747261696c'::bigint) AS "got"`;
const WAITING = `
  SELECT ${ENTRY_COLUMNS} FROM trail_unsealed u JOIN trail_entries e ON e.id = u.entry_id ORDER BY e.id LIMIT :most`;
const LAST_LINK = `
  SELECT sequence::text AS "sequence", link_sha256 AS "link" FROM trail_links ORDER BY trail_links.sequence DESC LIMIT 1`;
const ADD_LINKS = `
  INSERT INTO trail_links (sequence, entry_id, entry_sha256, link_sha256)
  SELECT l.sequence, l."entryId", l.entry, l.link
  FROM json_to_recordset(:links) AS l (sequence bigint, "entryId" bigint, entry text, link text)`;
const NO_LONGER_WAITING = `DELETE FROM trail_unsealed WHERE entry_id IN (:ids)`;
const ADD_HEAD = `
  INSERT INTO trail_heads (sequence, link_sha256, signed_at, signature) VALUES (:sequence, :link, :at, :signature)`;
