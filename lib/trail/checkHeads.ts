import type { KeyObject } from "node:crypto";
import { batches } from "./batches";
import type { Finding, Read } from "./finding";
import { readHead } from "./head";

type HeadRow = { sequence: string; signed: string; signature: string; linkHash: string | null };

/**
 * Every signed head against the link it was signed over.
 * @param kept heads that somebody kept outside: what is gone from the database altogether shows only against these
 */
export async function* checkHeads(read: Read, key: KeyObject, kept: readonly string[]): AsyncGenerator<Finding> {
  for await (const row of batches<HeadRow>(read, HEADS)) {
    const head = await readHead(row.signature, key);
    if (!head) yield finding("trail_heads", row.sequence, "is not signed by the issuer's key");
    else if (head.sequence !== row.sequence || head.link !== row.signed)
      yield finding("trail_heads", row.sequence, `was signed over another link, ${head.sequence} ${head.link}`);
    else if (row.linkHash !== row.signed)
      yield finding("trail_links", row.sequence, `is not the link that was signed on ${head.at}`);
  }
  for (const signature of kept) yield* checkKeptHead(read, key, signature);
  const [bare] = await read<{ sequence: string }>(FIRST_UNSIGNED);
  if (bare) yield finding("trail_links", bare.sequence, "stands after the last signed head");
}

async function* checkKeptHead(read: Read, key: KeyObject, signature: string): AsyncGenerator<Finding> {
  const head = await readHead(signature, key);
  if (!head) return yield finding("kept head", signature.slice(-8), "is not signed by the issuer's key");
  const [row] = await read<{ linkHash: string }>(LINK, [head.sequence]);
  if (row?.linkHash !== head.link)
    yield finding(
      "trail_links",
      head.sequence,
      `${row ? "differs from" : "is gone, named by"} the kept head of ${head.at}`,
    );
}

const finding = (table: string, key: string, disagrees: string): Finding => ({ table, key, disagrees });

const HEADS = `
  SELECT h.sequence::text AS "sequence", h.link_sha256 AS "signed", h.signature AS "signature", l.link_sha256 AS "linkHash"
  FROM trail_heads h LEFT JOIN trail_links l ON l.sequence = h.sequence
  WHERE h.sequence > $1 ORDER BY h.sequence LIMIT $2`;
const LINK = `SELECT link_sha256 AS "linkHash" FROM trail_links WHERE sequence = $1`;
// Links come in with their head, in one transaction.
const FIRST_UNSIGNED = `
  SELECT sequence::text AS "sequence" FROM trail_links
  WHERE sequence > (SELECT coalesce(max(sequence), 0) FROM trail_heads) ORDER BY trail_links.sequence LIMIT 1`;
