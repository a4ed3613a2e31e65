import "server-only";
import type { Transaction } from "sequelize";
import { select } from "@/lib/db";
import type { OpenedCase } from "@/lib/policies/exposure";

/**
 * The cases a person has opened at an employer, in the last months and on the days of that employer. What was sat at
 * another employer is that one's and does not count here.
 */
export const openedCases = (
  { technicianId, employerId }: { technicianId: string; employerId: string },
  now: Date,
  transaction?: Transaction,
): Promise<OpenedCase[]> => select<OpenedCase>(OPENED, { technicianId, employerId, now }, transaction);

// A month more than counts: which day it was, and whether it still counts, is the policy's to say.
const OPENED = `
  SELECT c.kind, c.check_id AS "checkId", r.module_id AS "moduleId", (c.requested_at AT TIME ZONE e.time_zone)::date::text AS day
  FROM cases c JOIN sittings s ON s.id = c.sitting_id JOIN releases r ON r.id = s.release_id
  JOIN employers e ON e.id = s.employer_id
  WHERE s.technician_id = :technicianId AND s.employer_id = :employerId
    AND c.requested_at > :now::timestamptz - interval '13 months'`;
