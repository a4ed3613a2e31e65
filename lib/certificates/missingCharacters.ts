import { loadedFont, loadPdfFonts, TEXT_FACES } from "./pdfFonts";

/** Characters that no face of the certificate can draw, each once, in the order met. The layout engine would print them wrong without an error. */
export async function missingCharacters(text: string): Promise<string[]> {
  await loadPdfFonts();
  const fonts = [400, 700].map((weight) => TEXT_FACES.map((face) => loadedFont(face, weight)));
  const drawable = (codePoint: number) =>
    fonts.every((stack) => stack.some((font) => font.hasGlyphForCodePoint(codePoint)));
  return [...new Set(text.normalize("NFC"))].filter((character) => !drawable(character.codePointAt(0) ?? 0));
}
