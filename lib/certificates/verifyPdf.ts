import { createHash, X509Certificate } from "node:crypto";
import { commonName } from "./commonName";
import { readCms, type CmsReading } from "./readCms";
import { readDescription } from "./readDescription";
import { signatureGaps, type SignatureGap } from "./signatureGap";

export type PdfVerdict = {
  /** "altered" covers changed bytes, added bytes and added signatures; only "genuine" may be relied on. */
  signature: "genuine" | "altered" | "absent" | "other-signer" | "unreadable";
  /** The signature covers every byte of the file but its own. */
  wholeFile: boolean;
  /** As the file says; worth nothing unless the signature is genuine. Null when the file is no certificate. */
  number: string | null;
  fingerprint: string | null;
  sha256: string;
  signerName: string | null;
};

export type TrustedIssuer = { certificatePem: string; rootPem: string };

export const LARGEST_PDF_BYTES = 10 * 1024 * 1024;

/**
 * Was this very file signed by the trusted issuer? Says nothing of the certificate's standing, which only the register knows.
 * Reads the bytes without parsing the document. Junk gives a verdict, never an error.
 * @throws RangeError when the trusted certificate was not issued by the trusted root: a fault of the installation
 */
export async function verifyPdf(pdf: Uint8Array, trusted: TrustedIssuer): Promise<PdfVerdict> {
  const chain = trustedChain(trusted);
  const sha256 = createHash("sha256").update(pdf).digest("hex");
  if (!isPdf(pdf)) {
    return { signature: "unreadable", wholeFile: false, number: null, fingerprint: null, sha256, signerName: null };
  }
  const gaps = signatureGaps(pdf);
  const readings = gaps.map((gap) => gap && tryRead(gap));
  return {
    signature: verdict(gaps, readings, chain),
    wholeFile: gaps.length === 1 && gaps[0]?.wholeFile === true,
    ...readDescription(pdf),
    sha256,
    signerName: readings.length === 1 && readings[0] ? commonName(readings[0].signer.subject) : null,
  };
}

function verdict(
  gaps: (SignatureGap | null)[],
  readings: (CmsReading | null)[],
  trusted: readonly [issuer: X509Certificate, root: X509Certificate],
): PdfVerdict["signature"] {
  if (gaps.length === 0) return "absent";
  const fromIssuer = readings.some((reading) => reading?.signer.raw.equals(trusted[0].raw));
  const [gap] = gaps;
  const [reading] = readings;
  if (gaps.length > 1 && fromIssuer) return "altered";
  if (!gap || !reading) return "unreadable";
  if (gaps.length > 1) return "other-signer";
  if (!gap.wholeFile || !reading.digestAgrees || !reading.signatureAgrees) return "altered";
  if (!fromIssuer) return "other-signer";
  return reading.certificates.every((certificate) => trusted.some(({ raw }) => raw.equals(certificate)))
    ? "genuine"
    : "altered";
}

function tryRead(gap: SignatureGap): CmsReading | null {
  try {
    return readCms(gap.cms, gap.signedParts);
  } catch {
    // The parsers throw errors of many kinds on junk; all of them mean that there is nothing to read.
    return null;
  }
}

const isPdf = (pdf: Uint8Array) =>
  pdf.length <= LARGEST_PDF_BYTES && Buffer.from(pdf.subarray(0, 5)).toString("latin1") === "%PDF-";

function trustedChain(trusted: TrustedIssuer): [X509Certificate, X509Certificate] {
  const issuer = new X509Certificate(trusted.certificatePem);
  const root = new X509Certificate(trusted.rootPem);
  if (root.ca && issuer.checkIssued(root) && issuer.verify(root.publicKey)) return [issuer, root];
  throw new RangeError("verifyPdf: the trusted certificate was not issued by the trusted root");
}
