import { expect, vi } from "vitest";
import type { Actor } from "@/lib/policies/actor";
import { ownerRows } from "./owner";

/** What an act has left in the database, seen by the owner. */
export const rowsOf = <Row extends object>(table: string) => ownerRows<Row>(`SELECT * FROM ${table}`);

/** Payloads of the jobs of a name, oldest first. */
export const jobsOf = async (name: string) =>
  (
    await ownerRows<{ data: Record<string, string> }>(
      "SELECT data FROM jobs.job WHERE name = $1 ORDER BY created_on, id",
      [name],
    )
  ).map(({ data }) => data);

/** Acts of a person as the trail has them, oldest first, each with the employer it names. */
export const trailOf = async ({ personId }: Pick<Actor, "personId">) =>
  ownerRows<{ act: string; employer: string; key: string }>(
    `SELECT act, employer_id AS employer, subject_key AS key FROM trail_entries WHERE actor_id = $1 ORDER BY id`,
    [personId],
  );

/** Count and content of every table and of the queue: equal before and after where nothing may be stored. */
export async function everythingStored(): Promise<Record<string, string>> {
  const tables = await ownerRows<{ name: string }>(TABLES);
  const parts = tables.map(
    ({ name }) => `
    SELECT '${name}' AS name, count(*) || ' ' || md5(coalesce(string_agg(t::text, chr(10) ORDER BY t::text), '')) AS content
    FROM ${name} t`,
  );
  const rows = await ownerRows<{ name: string; content: string }>(parts.join(" UNION ALL "));
  return Object.fromEntries(rows.map(({ name, content }) => [name, content]));
}

/**
 * Runs an act whose transaction fails in its very last step, after everything was written; nothing may be left of it.
 * @param table one that the act writes to
 */
export async function expectNothingLeft(table: string, act: () => Promise<unknown>): Promise<void> {
  const before = await everythingStored();
  await ownerRows(FAIL);
  await ownerRows(`
    CREATE CONSTRAINT TRIGGER fail_at_commit AFTER INSERT OR UPDATE ON ${table} DEFERRABLE INITIALLY DEFERRED
    FOR EACH ROW EXECUTE FUNCTION fail_at_commit()`);
  const warned = vi.spyOn(console, "warn").mockReturnValue();
  try {
    await expect(act()).rejects.toThrow("the commit fails");
  } finally {
    warned.mockRestore();
    await ownerRows("DROP FUNCTION fail_at_commit() CASCADE");
  }
  expect(await everythingStored()).toEqual(before);
}

/** Waits until so many statements wait for a lock that another transaction holds. */
export async function waitForWaiting(count = 1): Promise<void> {
  for (;;) {
    const [row] = await ownerRows<{ waiting: number }>(WAITING);
    if (row!.waiting >= count) return;
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}

const TABLES = `
  SELECT format('public.%I', tablename) AS name FROM pg_tables WHERE schemaname = 'public' AND tablename <> 'schema_steps'
  UNION ALL SELECT 'jobs.job'`;
const FAIL = `
  CREATE FUNCTION fail_at_commit() RETURNS trigger LANGUAGE plpgsql AS $$ BEGIN RAISE EXCEPTION 'the commit fails'; END $$`;
// What other roles' statements wait for is not shown to the owner, but that they wait is.
const WAITING = `
  SELECT count(DISTINCT l.pid)::int AS waiting FROM pg_locks l JOIN pg_stat_activity a ON a.pid = l.pid
  WHERE NOT l.granted AND a.datname = current_database()`;
