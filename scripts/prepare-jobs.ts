// Run by the owner role after the migrations: the queue library's own schema, one queue a job, rights for both processes.
import PgBoss from "pg-boss";
import { DEAD_LETTERS, JOBS, JOBS_SCHEMA, JOB_NAMES } from "@/lib/jobs/jobs";

const boss = new PgBoss({
  connectionString: process.env.OWNER_DATABASE_URL,
  schema: JOBS_SCHEMA,
  supervise: false,
  schedule: false,
});
await boss.start();
await boss.createQueue(DEAD_LETTERS, { name: DEAD_LETTERS });
for (const name of JOB_NAMES) {
  const settings = {
    name,
    retryLimit: JOBS[name].retries,
    retryDelay: 2,
    retryBackoff: true,
    expireInSeconds: JOBS[name].expireSeconds,
    deadLetter: DEAD_LETTERS,
  };
  await boss.createQueue(name, settings);
  await boss.updateQueue(name, settings);
}
// The queue tables are the library's: the web process adds jobs, the worker runs them.
for (const statement of [
  `GRANT USAGE ON SCHEMA ${JOBS_SCHEMA} TO lagmark_web, lagmark_worker`,
  `GRANT SELECT, INSERT ON ALL TABLES IN SCHEMA ${JOBS_SCHEMA} TO lagmark_web`,
  `GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA ${JOBS_SCHEMA} TO lagmark_worker`,
]) {
  await boss.getDb().executeSql(statement, []);
}
await boss.stop({ graceful: false });
