import "server-only";
import { QueryTypes } from "sequelize";
import { db } from "@/lib/db";
import { DEAD_LETTERS, JOBS_SCHEMA } from "@/lib/jobs/jobs";

/**
 * Tell whoever waits for a job that was tried as often as it may be; also one that only ever ran out of time, which no
 * process sees fail. `fault` is the reference that the log has too.
 */
export async function reportFaults(): Promise<void> {
  await db.query(REPORT, { replacements: { deadLetters: DEAD_LETTERS }, type: QueryTypes.INSERT });
}

/** Short enough to be read out on the telephone; the job's whole id stands in the log beside it. */
export const referenceOf = (jobId: string): string => jobId.slice(0, 8).toUpperCase();

// A job that was put back is no fault any more, also when it is done and its progress cleared; one that was given back has
// reported since, and its old failure is no news.
const REPORT = `
  INSERT INTO progress (subject_id, job, step, done, total, fault, updated_at)
  SELECT DISTINCT ON (subject, name) subject, name, 'failed', 0, 1, upper(left(id::text, 8)), completed_on
  FROM (
    SELECT id, name, completed_on, coalesce(data->>'caseId', data->>'decisionId', data->>'verificationId', data->>'runId')::uuid AS subject
    FROM ${JOBS_SCHEMA}.job WHERE state = 'failed' AND name <> :deadLetters
      AND NOT EXISTS (SELECT 1 FROM job_acts a WHERE a.job_id = job.id AND a.act = 'try again')
  ) failed
  WHERE subject IS NOT NULL ORDER BY subject, name, completed_on DESC
  ON CONFLICT (subject_id, job) DO UPDATE SET fault = excluded.fault, updated_at = excluded.updated_at
  WHERE progress.fault IS DISTINCT FROM excluded.fault AND progress.updated_at < excluded.updated_at`;
