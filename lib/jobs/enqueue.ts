import "server-only";
import PgBoss from "pg-boss";
import type { Transaction } from "sequelize";
import { JOBS, JOBS_SCHEMA, type JobName, type JobPayload } from "./jobs";

/**
 * Add a job in the transaction that causes it: a rollback drops it, a commit hands it to the worker.
 * @param startAfter do not run before; at once when left out
 */
export async function enqueue<Name extends JobName>(
  name: Name,
  payload: JobPayload<Name>,
  transaction: Transaction,
  startAfter?: Date,
): Promise<void> {
  const job = { name, data: JOBS[name].payload.parse(payload), startAfter: startAfter?.toISOString() };
  await queue.insert([job], { db: inside(transaction) } as PgBoss.ConnectionOptions);
}

// Never started: it only writes the insert, through the connection of the caller's transaction.
const queue = new PgBoss({ db: { executeSql: refuse }, schema: JOBS_SCHEMA, migrate: false, supervise: false });

async function refuse(): Promise<never> {
  throw new Error("enqueue: a job is only added inside a transaction");
}

// pg-boss numbers its parameters ($14), which sequelize.query would take for its own.
function inside(transaction: Transaction): PgBoss.Db {
  const { connection } = transaction as unknown as { connection: { query: PgBoss.Db["executeSql"] } };
  return { executeSql: (text, values) => connection.query(text, values) };
}
