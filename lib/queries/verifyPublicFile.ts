import "server-only";
import { readCertificateNumber } from "@/lib/certificates/number";
import { verifyPdf, type PdfVerdict } from "@/lib/certificates/verifyPdf";
import { issuerCertificates } from "./issuerCertificates";
import { getPublicVerification, type PublicVerification } from "./getPublicVerification";

export type PublicFileVerdict = {
  file: PdfVerdict;
  /** The register's entry for the number that the file names; null when it names none or none is known. */
  register: PublicVerification | null;
  /** Whether file and register are the same, byte for byte. */
  agrees: boolean;
};

/** Hold a file against its own signature and against the register. */
export async function verifyPublicFile(pdf: Uint8Array, now = new Date()): Promise<PublicFileVerdict> {
  const file = await verifyPdf(pdf, await issuerCertificates());
  const read = file.number ? readCertificateNumber(file.number) : null;
  const register = read && "number" in read ? await getPublicVerification(read.number, now) : null;
  const agrees = register !== null && register.pdfSha256 === file.sha256 && register.fingerprint === file.fingerprint;
  return { file, register, agrees };
}
