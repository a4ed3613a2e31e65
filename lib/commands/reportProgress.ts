import "server-only";
import { QueryTypes } from "sequelize";
import { db } from "@/lib/db";
import type { JobName } from "@/lib/jobs/jobs";

export type Report = { step: string; done: number; total: number };

/** How far a job has come, for the person who waits; an earlier fault is forgotten, since the job runs again. */
export async function reportProgress(subjectId: string, job: JobName, { step, done, total }: Report): Promise<void> {
  const replacements = { subjectId, job, step, done: Math.round(done), total: Math.round(total) };
  await db.query(REPORT, { replacements, type: QueryTypes.INSERT });
}

const REPORT = `
  INSERT INTO progress (subject_id, job, step, done, total) VALUES (:subjectId, :job, :step, :done, :total)
  ON CONFLICT (subject_id, job) DO UPDATE
  SET step = excluded.step, done = excluded.done, total = excluded.total, fault = NULL, updated_at = now()`;
