import type { Finding, Read } from "./finding";

/** Entries that no link names: sealing takes seconds, so after a minute one was kept out of the chain. */
export async function* checkUnlinked(read: Read, atMost: number): AsyncGenerator<Finding> {
  for (const { id, waits } of await read<{ id: string; waits: boolean }>(UNLINKED, [atMost])) {
    const disagrees = waits ? "waits to be sealed for more than a minute" : "is in no link and does not wait for one";
    yield { table: "trail_entries", key: id, disagrees };
  }
}

const UNLINKED = `
  SELECT e.id::text AS "id", u.entry_id IS NOT NULL AS "waits"
  FROM trail_entries e
  LEFT JOIN trail_links l ON l.entry_id = e.id
  LEFT JOIN trail_unsealed u ON u.entry_id = e.id
  WHERE l.sequence IS NULL AND e.at < now() - interval '1 minute' ORDER BY e.id LIMIT $1`;
