import { batches } from "./batches";
import { ENTRY_COLUMNS, entrySha256, type TrailEntry } from "./entry";
import type { Finding, Read } from "./finding";
import { linkSha256, NO_LINK } from "./link";

type LinkRow = { sequence: string; entryId: string; entryHash: string; linkHash: string } & (
  TrailEntry | { [Column in keyof TrailEntry]: null }
);

/** Works every entry's hash and every link out again, from the first on. */
export async function* checkLinks(read: Read): AsyncGenerator<Finding> {
  let previous = NO_LINK;
  let expected = 1n;
  for await (const row of batches<LinkRow>(read, LINKS)) {
    const whole = BigInt(row.sequence) === expected;
    if (!whole) yield missingLinks(expected, BigInt(row.sequence) - 1n);
    // After a gap there is nothing to compare this link with; the gap itself is told.
    if (whole && linkSha256(previous, row.entryHash) !== row.linkHash) {
      yield link(row, "does not follow from the link before it and its entry's hash");
    } else if (row.id === null) {
      yield { table: "trail_entries", key: row.entryId, disagrees: `is gone, link ${row.sequence} names it` };
    } else if (entrySha256(row) !== row.entryHash) {
      yield {
        table: "trail_entries",
        key: row.id,
        disagrees: `its content is not what link ${row.sequence} was made over`,
      };
    }
    previous = row.linkHash;
    expected = BigInt(row.sequence) + 1n;
  }
}

const link = (row: LinkRow, disagrees: string): Finding => ({ table: "trail_links", key: row.sequence, disagrees });

const missingLinks = (from: bigint, to: bigint): Finding => ({
  table: "trail_links",
  key: String(from),
  disagrees: from === to ? "is gone" : `is gone, with all up to ${to}`,
});

const LINKS = `
  SELECT l.sequence::text AS "sequence", l.entry_id::text AS "entryId", l.entry_sha256 AS "entryHash",
         l.link_sha256 AS "linkHash", ${ENTRY_COLUMNS}
  FROM trail_links l LEFT JOIN trail_entries e ON e.id = l.entry_id
  WHERE l.sequence > $1 ORDER BY l.sequence LIMIT $2`;
