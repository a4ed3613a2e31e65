import { renderToBuffer } from "@react-pdf/renderer";
import { PDFDocument } from "pdf-lib";
import { DENSITIES } from "./drawing/page";
import { VerificationDocument } from "./drawing/VerificationDocument";
import { loadPdfFonts } from "./pdfFonts";
import type { VerificationFacts } from "./verificationFacts";

/**
 * The unsigned record of a verification: A4, PDF 1.7, one page wherever its text fits one. The register printed the same
 * text on the certificate, so every character has its letter.
 */
export async function drawVerification(facts: VerificationFacts): Promise<Uint8Array> {
  await loadPdfFonts();
  const pdf = await closestDrawing(facts);
  describe(pdf, facts);
  return pdf.save({ useObjectStreams: false });
}

/** The loosest drawing of one page; the closest when none is: a record of two pages is better than none. */
async function closestDrawing(facts: VerificationFacts): Promise<PDFDocument> {
  let closest: PDFDocument | undefined;
  for (const density of DENSITIES) {
    const drawn = await renderToBuffer(<VerificationDocument facts={facts} density={density} />);
    closest = await PDFDocument.load(drawn, { updateMetadata: false });
    if (closest.getPageCount() === 1) break;
  }
  return closest!;
}

/** The keywords differ from a certificate's, so that no reader takes the one for the other. */
function describe(pdf: PDFDocument, { entry, origin }: VerificationFacts): void {
  const demonstration = entry.demonstration ? "Demonstration: " : "";
  const title = `${demonstration}Record of a verification, ${entry.number}: ${entry.standing} on ${entry.today}`;
  pdf.setTitle(title, { showInWindowTitleBar: true });
  pdf.setAuthor(`Register at ${origin}`);
  pdf.setSubject(`Read from the register at ${entry.readAt}`);
  pdf.setKeywords([`verification ${entry.number} fingerprint ${entry.fingerprint}`]);
}
