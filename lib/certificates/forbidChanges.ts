import { PDFArray, PDFDict, PDFInvalidObject, PDFName, PDFRef, type PDFDocument } from "pdf-lib";

/**
 * Makes the one signature field a certifying signature that allows no change (ISO 32000-1, 12.8.2.2: DocMDP, P 1), so that
 * viewers offer neither a second signature nor a comment.
 */
export function forbidChanges(document: PDFDocument): void {
  const { context, catalog } = document;
  const fields = catalog.lookup(PDFName.of("AcroForm"), PDFDict).lookup(PDFName.of("Fields"), PDFArray);
  const signature = fields.lookup(0, PDFDict).get(PDFName.of("V"));
  if (!(signature instanceof PDFRef)) throw new Error("forbidChanges: the document has no signature field");
  const reference = context.obj([
    {
      Type: "SigRef",
      TransformMethod: "DocMDP",
      TransformParams: { Type: "TransformParams", P: 1, V: "1.2" },
    },
  ]);
  context.assign(signature, withReference(document, signature, reference));
  catalog.set(PDFName.of("Perms"), context.obj({ DocMDP: signature }));
}

/** The placeholder is kept as bytes, so that its byte range stays where it is; the reference goes before its closing brackets. */
function withReference(document: PDFDocument, signature: PDFRef, reference: PDFArray): PDFInvalidObject {
  const placeholder = document.context.lookup(signature);
  if (!placeholder) throw new Error("forbidChanges: the signature field is empty");
  const bytes = new Uint8Array(placeholder.sizeInBytes());
  placeholder.copyBytesInto(bytes, 0);
  const text = Buffer.from(bytes)
    .toString("latin1")
    .replace(/>>\s*$/, `/Reference ${reference.toString()}\n>>`);
  return PDFInvalidObject.of(new Uint8Array(Buffer.from(text, "latin1")));
}
