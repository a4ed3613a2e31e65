import "server-only";
import type { Transaction } from "sequelize";
import { select } from "@/lib/db";
import { DEAD_LETTERS, JOBS_SCHEMA, type JobName } from "./jobs";

export type StoppedJob = {
  id: string;
  name: JobName;
  data: Record<string, string>;
  tries: number;
  fault: string | null;
  stoppedAt: Date;
};

/**
 * Jobs that were tried as often as they may be and that nobody has acted on, the newest first. The failed job itself is
 * read, also from the archive that the queue moves it to; its dead letter does not say which job it was.
 */
export const stoppedJobs = (transaction?: Transaction): Promise<StoppedJob[]> =>
  select<StoppedJob>(STOPPED, { deadLetters: DEAD_LETTERS }, transaction);

// The fault is the name of an error, as the worker writes it; one that only ran out of time has none.
const OF = (table: string) => `
  SELECT id, name, data, retry_count + 1 AS tries, output ->> 'error' AS fault, completed_on AS "stoppedAt"
  FROM ${JOBS_SCHEMA}.${table} WHERE state = 'failed' AND name <> :deadLetters`;
const STOPPED = `
  SELECT * FROM (${OF("job")} UNION ALL ${OF("archive")}) failed
  WHERE NOT EXISTS (SELECT 1 FROM job_acts a WHERE a.job_id = failed.id) ORDER BY "stoppedAt" DESC, id LIMIT 500`;
