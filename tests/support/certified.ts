import { createHash, randomBytes } from "node:crypto";
import { addDays } from "@/lib/calendar";
import { canonicalJson, fingerprintOf } from "@/lib/certificates/canonicalJson";
import { drawCertificateNumber } from "@/lib/certificates/number";
import { certificateRecord, type CertificateRecord } from "@/lib/certificates/record";
import type { FrontMatter } from "@/lib/mdx/frontMatter";
import type { StandingWord } from "@/lib/policies/standing";
import type { Outcome } from "@/models/Decision";
import { makeMarkingRecord, makeSitting, type Given, type Row } from "./chain";
import { minutesFrom, NOW } from "./clock";
import type { Firm } from "./factories";
import { insert, ownerRows } from "./owner";
import { LAG } from "./samples";

type Decision = Row<{ sittingId: string; outcome: string; decidedBy: string }>;
type Certificate = Row<{
  number: string;
  sittingId: string;
  decisionId: string;
  fingerprint: string;
  holderId: string;
}>;

/** Of a sitting whose one check is met, or not met for any other outcome than competent. */
export async function makeDecision(
  firm: Firm,
  given: Given<{ sitting: Row }, { outcome: Outcome; decidedBy: string; decidedAt: Date }> = {},
) {
  const { sitting: earlier, ...columns } = given;
  const sitting = earlier ?? (await makeSitting(firm));
  const { outcome = "competent", decidedAt = NOW } = columns;
  const [marked] = await ownerRows<{ id: string }>(RECORDS_OF_SITTING, [sitting.id]);
  if (!marked) await makeMarkingRecord(firm, { sitting, met: outcome === "competent" });
  const evidence = await ownerRows<object>(EVIDENCE, [sitting.id]);
  return insert<Decision>("decisions", {
    sittingId: sitting.id,
    outcome,
    reason: "All quantities were read with care.",
    declaration: "I have no interest in the outcome.",
    outsideLine: firm.decider.outsideLine,
    evidence,
    evidenceSha256: fingerprintOf(evidence),
    signedAfreshAt: minutesFrom(decidedAt, -1),
    decidedBy: firm.decider.personId,
    decidedAt,
    ...columns,
  });
}

/** Valid from the day of the decision on; the PDF is a few bytes that no reader opens, unless one is drawn. */
export async function makeCertificate(
  firm: Firm,
  given: Given<
    { decision: Decision },
    {
      number: string;
      effectiveOn: string;
      lastDay: string;
      pdf: Buffer | ((record: CertificateRecord) => Promise<Uint8Array>);
      issuedAt: Date;
    }
  > = {},
) {
  const { decision: earlier, ...columns } = given;
  const decision = earlier ?? (await makeDecision(firm));
  const [facts] = await ownerRows<Facts>(FACTS, [decision.id]);
  if (!facts) throw new Error(`makeCertificate: no decision ${decision.id}`);
  const { effectiveOn = "2026-12-01", number = drawCertificateNumber(randomBytes) } = columns;
  const { lastDay = addDays(effectiveOn, 1095) } = columns;
  const record = certificateRecord({
    number,
    holder: { name: facts.holder },
    issuer: {
      name: firm.employer.name,
      standing: "Employer attestation",
      accreditation: null,
      timeZone: firm.employer.timeZone,
    },
    scheme: { code: facts.matter.code, title: facts.matter.title, edition: facts.matter.edition },
    scope: facts.matter.scope,
    limits: facts.matter.limits,
    supervision: facts.matter.supervision,
    identity: null,
    release: { code: facts.matter.code, number: facts.release, fingerprint: facts.fingerprint },
    sittingId: decision.sittingId,
    decided: {
      by: facts.decider,
      outsideLine: facts.outside,
      at: facts.at.toISOString(),
      signedAfreshAt: facts.afresh.toISOString(),
    },
    effectiveOn,
    lastDay,
    quantities: [
      { check: "reading", title: "Read a correlator trace", label: LAG, tolerance: "0.2 chip", critical: false },
    ],
    demonstration: false,
  });
  const { pdf: file = Buffer.from(`%PDF-1.7 ${number}`) } = columns;
  const pdf = Buffer.isBuffer(file) ? file : Buffer.from(await file(record));
  const certificate = await insert<Certificate>("certificates", {
    decisionId: decision.id,
    sittingId: decision.sittingId,
    employerId: firm.employer.id,
    holderId: facts.holderId,
    record,
    recordText: canonicalJson(record),
    fingerprint: fingerprintOf(record),
    pdfSha256: createHash("sha256").update(pdf).digest("hex"),
    issuedAt: NOW,
    ...columns,
    number,
    effectiveOn,
    lastDay,
    pdf,
  });
  await makeStanding(firm, certificate);
  return certificate;
}

type StandingColumns = { standing: StandingWord; ground: string; reason: string; setBy: string; setAt: Date };

/** The next standing of a certificate; valid when nothing else is said. */
export async function makeStanding(firm: Firm, certificate: Row, over: Partial<StandingColumns> = {}) {
  const sql = "SELECT count(*)::int AS earlier FROM standings WHERE certificate_id = $1";
  const [{ earlier } = { earlier: 0 }] = await ownerRows<{ earlier: number }>(sql, [certificate.id]);
  return insert<Row<{ sequence: number; standing: StandingWord }>>("standings", {
    certificateId: certificate.id,
    sequence: earlier + 1,
    standing: "valid",
    ground: earlier === 0 ? "issued" : "reinstated",
    setBy: firm.decider.personId,
    setAt: NOW,
    ...over,
  });
}

const RECORDS_OF_SITTING = `SELECT m.id FROM marking_records m JOIN cases c ON c.id = m.case_id WHERE c.sitting_id = $1`;
const EVIDENCE = `
  SELECT s.check_id AS "checkId", s.id AS "caseId", m.id AS "markingRecordId", m.met, row_sha256(to_jsonb(m)) AS sha256
  FROM case_states s JOIN marking_records m ON m.id = s.record_id WHERE s.sitting_id = $1 ORDER BY s.check_id, s.number`;

type Facts = {
  holder: string;
  holderId: string;
  decider: string;
  outside: boolean;
  at: Date;
  afresh: Date;
  release: string;
  fingerprint: string;
  matter: FrontMatter;
};
const FACTS = `
  SELECT h.name AS holder, h.id AS "holderId", p.name AS decider, d.outside_line AS outside, d.decided_at AS at,
         d.signed_afresh_at AS afresh, r.number AS release, r.fingerprint, r.front_matter AS matter
  FROM decisions d JOIN sittings s ON s.id = d.sitting_id JOIN releases r ON r.id = s.release_id
  JOIN people h ON h.id = s.technician_id JOIN people p ON p.id = d.decided_by WHERE d.id = $1`;
