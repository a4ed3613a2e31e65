import { AFRelationship, type PDFDocument } from "pdf-lib";
import { canonicalJson } from "./canonicalJson";
import type { CertificateRecord } from "./record";

/** File name of the canonical record inside the certificate; its SHA-256 is the fingerprint. */
export const RECORD_FILE = "record.json";
export const CREDENTIAL_FILE = "credential.jwt";

/**
 * Document information and attachments. They are written through pdf-lib, which stores text in hexadecimal: nothing a person
 * typed can look like PDF syntax to a reader that searches the bytes.
 */
export async function describeCertificate(
  pdf: PDFDocument,
  record: CertificateRecord,
  { fingerprint, credential }: { fingerprint: string; credential?: string },
): Promise<void> {
  const demonstration = record.demonstration ? "Demonstration: " : "";
  pdf.setTitle(`${demonstration}Certificate of competence ${record.number}, ${record.holder.name}`, {
    showInWindowTitleBar: true,
  });
  pdf.setAuthor(record.issuer.name);
  pdf.setSubject(`${record.scheme.code} ${record.scheme.title}, release ${record.release.number}; ${record.number}`);
  pdf.setKeywords([`certificate ${record.number} sha256 ${fingerprint}`]);
  const at = new Date(record.decided.at);
  const file = { creationDate: at, modificationDate: at, afRelationship: AFRelationship.Data };
  // In the order of their names: readers search the list of attachments by halves.
  if (credential !== undefined) {
    await pdf.attach(new TextEncoder().encode(credential), CREDENTIAL_FILE, {
      ...file,
      mimeType: "application/vc+jwt",
      description: "The same certificate as a W3C Verifiable Credential",
    });
  }
  await pdf.attach(new TextEncoder().encode(canonicalJson(record)), RECORD_FILE, {
    ...file,
    mimeType: "application/json",
    description: "Canonical record (RFC 8785); its SHA-256 is the fingerprint on the page",
  });
}
