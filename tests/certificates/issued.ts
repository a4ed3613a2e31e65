import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { drawCertificate } from "@/lib/certificates/drawCertificate";
import { makeIssuerKey, type IssuerKeyFiles } from "@/lib/certificates/makeIssuerKey";
import { certificateRecord, type CertificateFacts } from "@/lib/certificates/record";
import type { IssuerKey } from "@/lib/certificates/signPdf";
import { certificateFacts } from "./certificateFacts";

export const SIGNED_AT = new Date("2026-03-14T10:23:04.000Z");

export const verifyAddress = (number: string) => `https://lagmark.example/verify/${number}`;

/** The unsigned certificate of the facts, changed where a test wants it. */
export async function drawn(changes: Partial<CertificateFacts> = {}) {
  const record = certificateRecord(certificateFacts(changes));
  const fingerprint = fingerprintOf(record);
  const { number, demonstration } = record;
  const pdf = await drawCertificate(record, { fingerprint, verifyAddress: verifyAddress(number), demonstration });
  return { record, fingerprint, pdf };
}

/** A root and issuer of a test; two calls give two of the same name. */
export const issuerKeyFiles = () =>
  makeIssuerKey({ organisation: "Lagmark test", demonstration: true, from: new Date("2026-01-01T00:00:00.000Z") });

export const issuerKey = ({ keyPem, certificatePem, rootPem }: IssuerKeyFiles): IssuerKey => ({
  keyPem,
  certificatePem,
  chainPem: [rootPem],
});
