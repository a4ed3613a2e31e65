import pg from "pg";
import type { Read } from "@/lib/trail/finding";

/** Everything read inside sees one moment of the database, in UTC, and writes nothing. */
export async function readSnapshot<Result>(address: string, run: (read: Read) => Promise<Result>): Promise<Result> {
  const client = new pg.Client({ connectionString: address });
  await client.connect();
  try {
    await client.query("BEGIN ISOLATION LEVEL REPEATABLE READ READ ONLY");
    await client.query("SET LOCAL timezone = 'UTC'; SET LOCAL bytea_output = 'hex'; SET LOCAL search_path = public");
    return await run(async (sql, values = []) => (await client.query(sql, values)).rows);
  } finally {
    await client.end();
  }
}
