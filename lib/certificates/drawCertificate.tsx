import { renderToBuffer } from "@react-pdf/renderer";
import { PDFDocument } from "pdf-lib";
import { InvalidError } from "@/lib/errors";
import { fingerprintOf } from "./canonicalJson";
import { describeCertificate } from "./describeCertificate";
import { CertificateDocument } from "./drawing/CertificateDocument";
import { DENSITIES } from "./drawing/page";
import { missingCharacters } from "./missingCharacters";
import { loadPdfFonts } from "./pdfFonts";
import type { CertificateRecord } from "./record";

/** `credential` is the same certificate for machines (application/vc+jwt), put into the file beside the record. */
export type DrawingOptions = {
  fingerprint: string;
  verifyAddress: string;
  demonstration: boolean;
  credential?: string;
};

/**
 * The unsigned certificate: one A4 page, PDF 1.7, the canonical record attached. The same record gives the same bytes.
 * @throws RangeError when fingerprint, address or demonstration belong to another record
 * @throws InvalidError when a character cannot be printed or the text does not fit the page
 */
export async function drawCertificate(record: CertificateRecord, options: DrawingOptions): Promise<Uint8Array> {
  refuseMismatch(record, options);
  await loadPdfFonts();
  await refuseUnprintable(record);
  const { fingerprint, verifyAddress } = options;
  for (const density of DENSITIES) {
    const face = { record, fingerprint, verifyAddress };
    const drawn = await renderToBuffer(<CertificateDocument face={face} density={density} />);
    const pdf = await PDFDocument.load(drawn, { updateMetadata: false });
    if (pdf.getPageCount() !== 1) continue;
    await describeCertificate(pdf, record, options);
    // Without object streams the signature can be placed by its bytes.
    return pdf.save({ useObjectStreams: false });
  }
  throw new InvalidError("The certificate does not fit one page. Shorten scope, limits or the names of quantities.");
}

function refuseMismatch(
  record: CertificateRecord,
  { fingerprint, verifyAddress, demonstration }: DrawingOptions,
): void {
  if (fingerprint !== fingerprintOf(record))
    throw new RangeError("drawCertificate: the fingerprint is not the record's");
  if (demonstration !== record.demonstration)
    throw new RangeError("drawCertificate: record and caller differ on demonstration");
  if (!verifyAddress.endsWith(`/verify/${record.number}`)) {
    throw new RangeError(`drawCertificate: the address must end in /verify/${record.number}, got ${verifyAddress}`);
  }
}

async function refuseUnprintable(record: CertificateRecord): Promise<void> {
  const missing = await missingCharacters(JSON.stringify(record));
  if (missing.length === 0) return;
  const named = missing.map((character) => `"${character}" (U+${codePoint(character)})`).join(", ");
  throw new InvalidError(`The certificate cannot print ${named}. Write it with letters the certificate has.`);
}

const codePoint = (character: string) => (character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, "0");
