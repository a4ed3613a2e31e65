import "server-only";
import { dayIn } from "@/lib/calendar";
import { select } from "@/lib/db";
import { ForbiddenError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { shownStanding, type ShownStanding, type StandingWord } from "@/lib/policies/standing";

type Row = {
  number: string;
  holder: string;
  title: string;
  code: string;
  release: string;
  issuer: string;
  effectiveOn: string;
  lastDay: string;
  stored: StandingWord;
  timeZone: string;
};
export type CertificateRow = Omit<Row, "stored" | "timeZone"> & { standing: ShownStanding; daysLeft: number };

/** A person's own certificates, of whichever employer: they stay the holder's for life. */
export const listOwnCertificates = (actor: Pick<Actor, "personId">, now = new Date()): Promise<CertificateRow[]> =>
  list("c.holder_id = :id", actor.personId, now);

/** All that the employer has issued. */
export async function listCertificates(actor: Actor, now = new Date()): Promise<CertificateRow[]> {
  if (!actor.roles.some((role) => role !== "technician"))
    throw new ForbiddenError("You may not read the firm's certificates.");
  return list("c.employer_id = :id", actor.employerId, now);
}

/** The same for the people who keep the register. */
export async function listRegister(actor: Actor, now = new Date()): Promise<CertificateRow[]> {
  authorize(can.readQueue(actor, actor), "read the register");
  return list("c.employer_id = :id", actor.employerId, now);
}

async function list(where: string, id: string, now: Date): Promise<CertificateRow[]> {
  const rows = await select<Row>(`${SQL} WHERE ${where} ORDER BY c.issued_at DESC LIMIT 500`, { id });
  return rows.map(({ stored, timeZone, ...row }) => {
    const today = dayIn(timeZone, now);
    const daysLeft = Math.round((Date.parse(row.lastDay) - Date.parse(today)) / 86_400_000) + 1;
    return { ...row, standing: shownStanding(stored, row.effectiveOn, row.lastDay, today), daysLeft };
  });
}

const SQL = `
  SELECT c.number, p.name AS holder, r.title, m.code, r.number AS release, e.name AS issuer, c.effective_on::text AS "effectiveOn",
    c.last_day::text AS "lastDay", z.standing AS stored, e.time_zone AS "timeZone"
  FROM certificates c JOIN certificate_standings z ON z.certificate_id = c.id JOIN people p ON p.id = c.holder_id
  JOIN sittings s ON s.id = c.sitting_id JOIN releases r ON r.id = s.release_id JOIN modules m ON m.id = r.module_id
  JOIN employers e ON e.id = c.employer_id`;
