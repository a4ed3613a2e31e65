import "server-only";
import { z } from "zod";

/**
 * Every background job by name: what it carries, how long one run may take before it counts as lost (a killed
 * worker's job runs again after that) and how often it is tried.
 */
export const JOBS = {
  "build-case": { payload: z.object({ caseId: z.uuid() }).strict(), expireSeconds: 120, retries: 5 },
  "close-case": { payload: z.object({ caseId: z.uuid() }).strict(), expireSeconds: 30, retries: 10 },
  "mark-case": { payload: z.object({ caseId: z.uuid() }).strict(), expireSeconds: 180, retries: 5 },
  "review-case": {
    payload: z.object({ reviewId: z.uuid(), caseId: z.uuid() }).strict(),
    expireSeconds: 180,
    retries: 5,
  },
  "mark-again": { payload: z.object({ actId: z.uuid() }).strict(), expireSeconds: 60, retries: 10 },
  "check-release": { payload: z.object({ runId: z.uuid() }).strict(), expireSeconds: 180, retries: 5 },
  "issue-certificate": { payload: z.object({ decisionId: z.uuid() }).strict(), expireSeconds: 60, retries: 10 },
  "sign-verification": {
    payload: z.object({ verificationId: z.uuid() }).strict(),
    expireSeconds: 30,
    retries: 3,
  },
  "send-mail": { payload: z.object({ mailId: z.uuid() }).strict(), expireSeconds: 60, retries: 20 },
} as const;

export type JobName = keyof typeof JOBS;
export type JobPayload<Name extends JobName> = z.infer<(typeof JOBS)[Name]["payload"]>;
export const JOB_NAMES = Object.keys(JOBS) as JobName[];

/** Where a job goes that was tried as often as it may be; people look at it there. */
export const DEAD_LETTERS = "dead-letters";
export const JOBS_SCHEMA = "jobs";
