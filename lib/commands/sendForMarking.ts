import "server-only";
import type { Transaction } from "sequelize";
import { kindOf } from "@/lib/checks/registry";
import { select } from "@/lib/db";
import { enqueue } from "@/lib/jobs/enqueue";
import type { Case, Sitting } from "@/models";
import { writeMail } from "./writeMail";

type HandedIn = { case: Case; sitting: Sitting };

/** What follows a hand-in: the worker marks it, or the assessors hear that it waits for one of them. */
export async function sendForMarking(handed: HandedIn, publicOrigin: string, transaction: Transaction): Promise<void> {
  const { id: caseId, kind, kindVersion } = handed.case;
  if (kindOf(kind, kindVersion).judged) await tellAssessors(handed, publicOrigin, transaction);
  else await enqueue("mark-case", { caseId }, transaction);
}

type Waiting = { technician: string; title: string; checkTitle: string; slug: string };

async function tellAssessors({ case: found, sitting }: HandedIn, publicOrigin: string, transaction: Transaction) {
  const [waiting] = await select<Waiting>(WAITING, { caseId: found.id }, transaction);
  if (!waiting) throw new Error(`sendForMarking: case ${found.id} hangs on nothing`);
  const { technician, title, checkTitle, slug } = waiting;
  const { employerId, technicianId } = sitting;
  for (const { email } of await select<{ email: string }>(ASSESSORS, { employerId, technicianId }, transaction)) {
    const subject = `To be judged: ${technician}, ${checkTitle}`;
    const body = `${technician} has handed in "${checkTitle}" (${title}, sitting S-${sitting.number}). An assessor judges it line by line, with a reason for what is outside.\n\n${publicOrigin}/${slug}/queue/judging/${found.id}\n`;
    await writeMail({ to: email, subject, body }, transaction);
  }
}

const WAITING = `
  SELECT p.name AS technician, r.title, e.slug,
    (SELECT c ->> 'title' FROM jsonb_array_elements(r.checks) c WHERE c ->> 'id' = x.check_id) AS "checkTitle"
  FROM cases x JOIN sittings s ON s.id = x.sitting_id JOIN releases r ON r.id = s.release_id
  JOIN people p ON p.id = s.technician_id JOIN employers e ON e.id = s.employer_id WHERE x.id = :caseId`;
const ASSESSORS = `
  SELECT p.email FROM people p JOIN role_grants g ON g.person_id = p.id
  WHERE g.employer_id = :employerId AND g.role = 'assessor' AND g.ended_at IS NULL AND p.id <> :technicianId
  ORDER BY p.email`;
