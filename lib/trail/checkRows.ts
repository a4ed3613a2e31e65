import type { Finding, Read } from "./finding";
import { TRAILED_TABLES } from "./trailed-tables";

type Differing = { key: string; recorded: string | null; present: string | null };

/** Every row as it stands now against the newest entry about it. */
export async function* checkRows(
  read: Read,
  atMost: number,
  unreadable: (table: string) => void,
): AsyncGenerator<Finding> {
  for (const table of TRAILED_TABLES) {
    // The web process's role may not read every table; asking first keeps the transaction usable.
    const [{ allowed }] = await read<{ allowed: boolean }>(`SELECT has_table_privilege($1, 'SELECT') AS "allowed"`, [
      table,
    ]);
    if (!allowed) unreadable(table);
    else for (const row of await read<Differing>(differing(table), [table, atMost])) yield finding(table, row);
  }
}

const finding = (table: string, { key, recorded, present }: Differing): Finding => ({
  table,
  key,
  disagrees: !recorded
    ? "has no entry in the trail"
    : present
      ? "was changed without an entry"
      : "is gone, the trail has it",
});

// The hash is written out here and not left to the database's own function, which its owner could replace. Empty columns
// are left out, so that a column added later does not change the hashes of rows that were there before.
const differing = (table: (typeof TRAILED_TABLES)[number]) => `
  WITH newest AS (
    SELECT DISTINCT ON (subject_key) subject_key AS key, row_sha256 AS hash FROM trail_entries
    WHERE subject_table = $1 ORDER BY subject_key, id DESC
  ), present AS (
    SELECT coalesce(j->>'id', j->>'case_id', (j->>'release_id') || '/' || (j->>'person_id') || '/' || (j->>'part')) AS key,
           encode(sha256(convert_to(coalesce(
             (SELECT jsonb_object_agg(f.key, f.value) FROM jsonb_each(j) f WHERE f.value <> 'null'::jsonb), '{}'
           )::text, 'UTF8')), 'hex') AS hash
    FROM (SELECT to_jsonb(t) AS j FROM ${table} t) rows
  )
  SELECT coalesce(newest.key, present.key) AS "key", newest.hash AS "recorded", present.hash AS "present"
  FROM newest FULL JOIN present USING (key)
  WHERE newest.hash IS DISTINCT FROM present.hash ORDER BY 1 LIMIT $2`;
