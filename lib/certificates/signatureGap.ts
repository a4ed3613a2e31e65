/** Where a PDF's only signature stands in its bytes. */
export type SignatureGap = { cms: Uint8Array; signedParts: [Uint8Array, Uint8Array]; wholeFile: boolean };

/** More than any signature of ours can be: 128 kB of hexadecimal figures. */
const LONGEST_CONTENTS = 131_072;
/** One is right, two are wrong; a file of a million costs no more than a file of three. */
const MOST_READ = 3;
const BYTE_RANGE = /\/ByteRange\s*\[\s*(\d{1,10})\s+(\d{1,10})\s+(\d{1,10})\s+(\d{1,10})\s*\]/g;

/**
 * Reads every signature's byte range and contents without parsing the document, so that a hostile file costs one pass over its
 * bytes. A gap that is not exactly one hexadecimal string with zeros after the CMS gives null in its place.
 */
export function signatureGaps(pdf: Uint8Array): (SignatureGap | null)[] {
  const text = Buffer.from(pdf.buffer, pdf.byteOffset, pdf.byteLength).toString("latin1");
  const matches = [...text.matchAll(BYTE_RANGE)].slice(0, MOST_READ);
  return matches.map((match) => gap(pdf, text, match.slice(1).map(Number)));
}

function gap(pdf: Uint8Array, text: string, [start, length, resume, rest]: number[]): SignatureGap | null {
  const gapStart = start + length;
  const contents = text.slice(gapStart, resume);
  if (resume <= gapStart || resume + rest > pdf.length || contents.length > LONGEST_CONTENTS) return null;
  // Lower case only, as we write it: in any case the same signature could be spelt in many ways.
  const figures = /^<([0-9a-f]+)>$/.exec(contents)?.[1];
  if (figures === undefined || figures.length % 2 !== 0) return null;
  const cms = cmsOf(Buffer.from(figures, "hex"));
  if (!cms) return null;
  return {
    cms,
    signedParts: [pdf.subarray(start, gapStart), pdf.subarray(resume, resume + rest)],
    wholeFile: start === 0 && resume + rest === pdf.length,
  };
}

/** The DER sequence at the head of the contents; what follows must be zeros, or something could hide there. */
function cmsOf(contents: Uint8Array): Uint8Array | null {
  const length = derLength(contents);
  if (length === null || length > contents.length || contents.subarray(length).some((byte) => byte !== 0)) return null;
  return contents.subarray(0, length);
}

/** Length of a DER SEQUENCE with its head, by ITU-T X.690, 8.1.3; null for indefinite or odd lengths. */
function derLength(bytes: Uint8Array): number | null {
  if (bytes[0] !== 0x30) return null;
  const first = bytes[1];
  if (first < 0x80) return 2 + first;
  const count = first & 0x7f;
  if (count === 0 || count > 3) return null;
  return 2 + count + bytes.subarray(2, 2 + count).reduce((length, byte) => length * 256 + byte, 0);
}
