import "server-only";
import { dayIn } from "@/lib/calendar";
import type { CertificateRecord } from "@/lib/certificates/record";
import { select } from "@/lib/db";
import { shownStanding, type ShownStanding, type StandingWord } from "@/lib/policies/standing";
import { iso } from "./findOwn";

type Row = {
  number: string;
  record: CertificateRecord;
  fingerprint: string;
  pdfSha256: string;
  effectiveOn: string;
  lastDay: string;
  issuedAt: Date;
  timeZone: string;
  stored: StandingWord;
  ground: string;
  setAt: Date;
};

/** What anybody with the full number may know: no values, no gauges, no reasons of a decision. */
export type PublicVerification = Pick<
  CertificateRecord,
  | "number"
  | "scheme"
  | "scope"
  | "limits"
  | "supervision"
  | "identity"
  | "release"
  | "quantities"
  | "cautions"
  | "demonstration"
> & {
  holder: string;
  issuer: { name: string; standing: string; accreditation: string | null; timeZone: string };
  /** A decider's part and place, not the name. */
  decided: { outsideLine: boolean; at: string };
  fingerprint: string;
  pdfSha256: string;
  effectiveOn: string;
  lastDay: string;
  issuedAt: string;
  standing: ShownStanding;
  /** Class of ground of a suspension or withdrawal; never its free text. */
  ground: string | null;
  standingSince: string;
  /** The day it was when the register was read, in the issuer's time zone. */
  today: string;
  readAt: string;
};

export async function getPublicVerification(number: string, now = new Date()): Promise<PublicVerification | null> {
  const [row] = await select<Row>(SQL, { number });
  if (!row) return null;
  const today = dayIn(row.timeZone, now);
  const { record } = row;
  return {
    number: row.number,
    holder: record.holder.name,
    issuer: {
      ...{ name: record.issuer.name, standing: record.issuer.standing, accreditation: record.issuer.accreditation },
      timeZone: row.timeZone,
    },
    scheme: record.scheme,
    scope: record.scope,
    limits: record.limits,
    supervision: record.supervision,
    identity: record.identity,
    release: record.release,
    decided: { outsideLine: record.decided.outsideLine, at: record.decided.at },
    quantities: record.quantities,
    cautions: record.cautions,
    demonstration: record.demonstration,
    fingerprint: row.fingerprint,
    pdfSha256: row.pdfSha256,
    effectiveOn: row.effectiveOn,
    lastDay: row.lastDay,
    issuedAt: iso(row.issuedAt),
    standing: shownStanding(row.stored, row.effectiveOn, row.lastDay, today),
    ground: row.stored === "valid" ? null : row.ground,
    standingSince: iso(row.setAt),
    today,
    readAt: iso(now),
  };
}

const SQL = `
  SELECT c.number, c.record, c.fingerprint, c.pdf_sha256 AS "pdfSha256", c.effective_on::text AS "effectiveOn",
    c.last_day::text AS "lastDay", c.issued_at AS "issuedAt", e.time_zone AS "timeZone", z.standing AS stored, z.ground, z.set_at AS "setAt"
  FROM certificates c JOIN certificate_standings z ON z.certificate_id = c.id JOIN employers e ON e.id = c.employer_id
  WHERE c.number = :number`;
