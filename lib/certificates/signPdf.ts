import { X509Certificate } from "node:crypto";
import { pdflibAddPlaceholder } from "@signpdf/placeholder-pdf-lib";
import { SignPdf } from "@signpdf/signpdf";
import { Signer, SUBFILTER_ETSI_CADES_DETACHED } from "@signpdf/utils";
import { PDFDocument } from "pdf-lib";
import { commonName } from "./commonName";
import { forbidChanges } from "./forbidChanges";
import { signatureGaps } from "./signatureGap";
import { padesSignature, type IssuerKey } from "./pades";

export type { IssuerKey };

/** Room for the CMS in bytes; ours takes about 1.3 kB, a time stamp would take 6 kB more. */
export const SIGNATURE_BYTES = 16_384;

const ISSUED = "Issued and entered in the register";

/**
 * Signs an unsigned PDF over all of its bytes (PAdES baseline, /ETSI.CAdES.detached) and forbids later changes.
 * @param at the signing time claimed in /M; nothing proves it
 * @param reason what the signature says it is for
 */
export async function signPdf(
  pdf: Uint8Array,
  key: IssuerKey,
  at: Date = new Date(),
  reason = ISSUED,
): Promise<Uint8Array> {
  if (signatureGaps(pdf).length > 0) throw new RangeError("signPdf: the file is signed already");
  const document = await PDFDocument.load(pdf, { updateMetadata: false });
  pdflibAddPlaceholder({
    pdfDoc: document,
    reason,
    contactInfo: "",
    location: "",
    name: commonName(new X509Certificate(key.certificatePem).subject),
    signingTime: at,
    signatureLength: SIGNATURE_BYTES,
    subFilter: SUBFILTER_ETSI_CADES_DETACHED,
  });
  forbidChanges(document);
  const prepared = await document.save({ useObjectStreams: false });
  return new Uint8Array(await new SignPdf().sign(Buffer.from(prepared), new RegisterSigner(key), at));
}

class RegisterSigner extends Signer {
  constructor(private readonly key: IssuerKey) {
    super();
  }

  override async sign(content: Buffer): Promise<Buffer> {
    return Buffer.from(await padesSignature(content, this.key));
  }
}
