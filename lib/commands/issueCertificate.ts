import "server-only";
import { createHash, randomBytes } from "node:crypto";
import type { Transaction } from "sequelize";
import { addDays, addMonths, dayIn } from "@/lib/calendar";
import { canonicalJson, fingerprintOf } from "@/lib/certificates/canonicalJson";
import { drawCertificate } from "@/lib/certificates/drawCertificate";
import { drawCertificateNumber } from "@/lib/certificates/number";
import { certificateRecord, type CertificateRecord } from "@/lib/certificates/record";
import { signPdf, type IssuerKey } from "@/lib/certificates/signPdf";
import { verifyPdf } from "@/lib/certificates/verifyPdf";
import { Certificate, Sitting, Standing } from "@/models";
import { findDecision, type FoundDecision } from "./findDecision";
import { transact } from "./transact";
import { writeMail } from "./writeMail";

export type IssueTools = { issuerKey: IssuerKey; rootPem: string; publicOrigin: string; demonstration: boolean };

/** Issue the certificate of a decision of competent, enter it in the register as valid and mail it. Run twice, the first stays. */
export async function issueCertificate(
  decisionId: string,
  tools: IssueTools,
  now = () => new Date(),
): Promise<"issued" | "was issued"> {
  if (await Certificate.count({ where: { decisionId } })) return "was issued";
  const found = await findDecision(decisionId);
  const issuedAt = now();
  const record = await recordOf(found, tools.demonstration);
  const pdf = await signedPdf(record, tools, issuedAt);
  const { decision, sitting } = found;
  return transact({ personId: "", employerId: sitting.employerId }, async (transaction) => {
    await Sitting.findByPk(sitting.id, { transaction, lock: transaction.LOCK.UPDATE });
    if (await Certificate.count({ where: { decisionId }, transaction })) return "was issued";
    const certificate = await Certificate.create(
      { ...columns(found, record, pdf), decisionId, sittingId: sitting.id, issuedAt },
      { transaction },
    );
    await Standing.create(
      {
        ...{ certificateId: certificate.id, sequence: 1, standing: "valid", ground: "decision" },
        ...{ setBy: decision.decidedBy, setAt: issuedAt },
      },
      { transaction },
    );
    await mailToHolder(found, certificate, tools.publicOrigin, transaction);
    return "issued";
  });
}

async function recordOf(found: FoundDecision, demonstration: boolean): Promise<CertificateRecord> {
  const { decision, sitting, release, employer, decider, holder, quantities } = found;
  const { code, title, edition, scope, limits, supervision, valid } = release.frontMatter;
  const effectiveOn = dayIn(employer.timeZone, decision.decidedAt);
  return certificateRecord({
    number: await freeNumber(),
    holder: { name: holder.name },
    issuer: {
      ...{ name: employer.name, standing: employer.issuerStanding, accreditation: null, timeZone: employer.timeZone },
    },
    scheme: { code, title, edition },
    scope,
    limits,
    supervision,
    // No person confirms identity in this release of the product, and the certificate says so.
    identity: null,
    release: { code, number: release.number, fingerprint: release.fingerprint },
    sittingId: `S-${sitting.number}`,
    decided: {
      by: decider.name,
      outsideLine: decision.outsideLine,
      at: decision.decidedAt.toISOString(),
      signedAfreshAt: decision.signedAfreshAt.toISOString(),
    },
    effectiveOn,
    // The last day is included, so 36 months from 14 March end on 13 March.
    lastDay: addDays(addMonths(effectiveOn, valid.months), -1),
    quantities,
    demonstration,
  });
}

// The register's own rule refuses a number twice; asking first saves drawing a certificate in vain.
async function freeNumber(): Promise<string> {
  const number = drawCertificateNumber(randomBytes);
  return (await Certificate.count({ where: { number } })) ? freeNumber() : number;
}

async function signedPdf(record: CertificateRecord, tools: IssueTools, at: Date): Promise<Buffer> {
  const fingerprint = fingerprintOf(record);
  const verifyAddress = `${tools.publicOrigin}/verify/${record.number}`;
  const drawn = await drawCertificate(record, { fingerprint, verifyAddress, demonstration: tools.demonstration });
  const pdf = await signPdf(drawn, tools.issuerKey, at);
  // What a stranger will do with the file is done here first: nothing is issued that does not verify.
  const trusted = { certificatePem: tools.issuerKey.certificatePem, rootPem: tools.rootPem };
  const verdict = await verifyPdf(pdf, trusted);
  const same = verdict.number === record.number && verdict.fingerprint === fingerprint;
  if (verdict.signature !== "genuine" || !verdict.wholeFile || !same) {
    throw new Error(`issueCertificate: the signed file of ${record.number} does not verify: ${verdict.signature}`);
  }
  return Buffer.from(pdf);
}

function columns({ sitting, holder }: FoundDecision, record: CertificateRecord, pdf: Buffer) {
  const { number, effectiveOn, lastDay } = record;
  const pdfSha256 = createHash("sha256").update(pdf).digest("hex");
  const written = { record, recordText: canonicalJson(record), fingerprint: fingerprintOf(record) };
  return {
    ...written,
    number,
    effectiveOn,
    lastDay,
    pdf,
    pdfSha256,
    employerId: sitting.employerId,
    holderId: holder.id,
  };
}

async function mailToHolder(
  { holder, employer, release }: FoundDecision,
  { id: certificateId, number, lastDay }: Certificate,
  publicOrigin: string,
  transaction: Transaction,
): Promise<void> {
  const subject = `Competent: your certificate ${number}`;
  const body = `Your sitting of "${release.title}" at ${employer.name} is decided: competent. Your certificate ${number} is attached; its last day is ${lastDay}.\n\nAnyone can verify it, now and on any later day:\n${publicOrigin}/verify/${number}\n\nIt is the employer's statement of competence, not a licence, and nothing in it is approved for safety-of-life use.\n`;
  await writeMail({ to: holder.email, subject, body, certificateId }, transaction);
}
