import { isCertificateNumber } from "./isCertificateNumber";

/** /Keywords as we write it: UTF-16 in hexadecimal. */
const KEYWORDS = /\/Keywords\s*<FEFF([0-9A-F]{4,1024})>/g;

/** Number and fingerprint from the document information of one of our certificates; nulls for any other file. */
export function readDescription(pdf: Uint8Array): { number: string | null; fingerprint: string | null } {
  const text = Buffer.from(pdf.buffer, pdf.byteOffset, pdf.byteLength).toString("latin1");
  const found = [...text.matchAll(KEYWORDS)];
  const words = found.length === 1 ? utf16(found[0][1]) : "";
  const match = /^certificate (LM-\S{13}) sha256 ([0-9a-f]{64})$/.exec(words);
  if (!match || !isCertificateNumber(match[1])) return { number: null, fingerprint: null };
  return { number: match[1], fingerprint: match[2] };
}

const utf16 = (hex: string) => Buffer.from(hex, "hex").swap16().toString("utf16le");
