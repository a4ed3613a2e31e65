import { ownerRows } from "./owner";

/** Empty every table but the list of schema steps, and the queue. Truncating passes the triggers that keep records. */
export async function emptyTables(): Promise<void> {
  statement ??= `TRUNCATE ${(await tables()).join(", ")} RESTART IDENTITY CASCADE`;
  await ownerRows(statement);
  await ownerRows("DELETE FROM jobs.job");
}

let statement: string | undefined;

const tables = async () => (await ownerRows<{ name: string }>(TABLES)).map((table) => `"${table.name}"`);

const TABLES = `SELECT tablename AS name FROM pg_tables WHERE schemaname = 'public' AND tablename <> 'schema_steps'`;
