import "server-only";
import { stoppedJobs } from "@/lib/jobs/stoppedJobs";
import type { JobName } from "@/lib/jobs/jobs";
import { authorize } from "@/lib/policies/authorize";
import { iso } from "./findOwn";

export type StoppedJobRow = {
  id: string;
  job: JobName;
  /** What it was about, by its id alone: "caseId 7f3a..." and so on. */
  subject: { what: string; id: string }[];
  tries: number;
  fault: string | null;
  stoppedAt: string;
};

/** The stopped jobs of the whole installation, for its operator: ids and names of errors, no words of people. */
export async function listStoppedJobs(person: { isOperator: boolean }): Promise<StoppedJobRow[]> {
  authorize(person.isOperator, "see the stopped jobs");
  return (await stoppedJobs()).map(({ id, name, data, tries, fault, stoppedAt }) => ({
    ...{ id, job: name, tries, fault, stoppedAt: iso(stoppedAt) },
    subject: Object.entries(data).map(([what, value]) => ({ what: what.replace(/Id$/, ""), id: value })),
  }));
}
