import "server-only";
import type { CertificateRecord } from "@/lib/certificates/record";
import { dayIn } from "@/lib/calendar";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { shownStanding, type ShownStanding, type StandingWord } from "@/lib/policies/standing";
import { iso } from "./findOwn";

type Row = {
  number: string;
  employerId: string;
  holderId: string;
  holder: string;
  sittingId: string;
  record: CertificateRecord;
  fingerprint: string;
  effectiveOn: string;
  lastDay: string;
  issuedAt: Date;
  timeZone: string;
};
type StandingRow = { standing: StandingWord; ground: string; reason: string; setBy: string; setAt: Date };

export type CertificateView = Omit<Row, "holderId" | "issuedAt" | "timeZone"> & {
  issuedAt: string;
  shown: ShownStanding;
  stored: StandingWord;
  history: (Omit<StandingRow, "setAt"> & { setAt: string })[];
  isMine: boolean;
  maySetStanding: boolean;
};

/** A certificate with the whole history of its standing, for the holder and the issuer's own people. */
export async function getCertificate(actor: Actor, number: string, now = new Date()): Promise<CertificateView | null> {
  const [row] = await select<Row>(SQL, { number });
  if (!row || !can.readCertificate(actor, row)) return null;
  const history = await select<StandingRow>(HISTORY, { number });
  const { holderId, timeZone, ...view } = row;
  const stored = history.at(-1)!.standing;
  return {
    ...view,
    issuedAt: iso(row.issuedAt),
    shown: shownStanding(stored, row.effectiveOn, row.lastDay, dayIn(timeZone, now)),
    stored,
    history: history.map((one) => ({ ...one, setAt: iso(one.setAt) })),
    isMine: holderId === actor.personId,
    maySetStanding: can.setStanding(actor, row),
  };
}

/** The same for the people who keep the issuer's register. */
export async function getRegisterEntry(actor: Actor, number: string): Promise<CertificateView | null> {
  authorize(can.readQueue(actor, actor), "read the register");
  const certificate = await getCertificate(actor, number);
  return certificate?.employerId === actor.employerId ? certificate : null;
}

type PdfRow = { pdf: Buffer; employerId: string; holderId: string };

/** The signed file exactly as it was issued. */
export async function getCertificatePdf(actor: Actor, number: string): Promise<Buffer | null> {
  const [row] = await select<PdfRow>(PDF, { number });
  return row && can.readCertificate(actor, row) ? row.pdf : null;
}

/** The same for the holder, who keeps it when no role is left at the issuer. */
export async function getOwnCertificatePdf(
  { personId }: Pick<Actor, "personId">,
  number: string,
): Promise<Buffer | null> {
  const [row] = await select<PdfRow>(PDF, { number });
  return row?.holderId === personId ? row.pdf : null;
}

const SQL = `
  SELECT c.number, c.employer_id AS "employerId", c.holder_id AS "holderId", p.name AS holder, c.sitting_id AS "sittingId", c.record,
    c.fingerprint, c.effective_on::text AS "effectiveOn", c.last_day::text AS "lastDay", c.issued_at AS "issuedAt",
    e.time_zone AS "timeZone"
  FROM certificates c JOIN people p ON p.id = c.holder_id JOIN employers e ON e.id = c.employer_id WHERE c.number = :number`;
const HISTORY = `
  SELECT z.standing, z.ground, z.reason, p.name AS "setBy", z.set_at AS "setAt" FROM standings z
  JOIN certificates c ON c.id = z.certificate_id JOIN people p ON p.id = z.set_by WHERE c.number = :number ORDER BY z.sequence`;
const PDF = `SELECT pdf, employer_id AS "employerId", holder_id AS "holderId" FROM certificates WHERE number = :number`;
