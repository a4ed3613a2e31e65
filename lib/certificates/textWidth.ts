import { loadedFont, TEXT_FACES } from "./pdfFonts";

/** Width in points of text set in the text faces on one line, with the same fallback the drawing uses; call loadPdfFonts first. */
export function textWidth(text: string, weight: number, sizePt: number): number {
  const fonts = TEXT_FACES.map((face) => loadedFont(face, weight));
  let width = 0;
  for (let start = 0; start < text.length;) {
    const font = fontFor(fonts, text, start);
    let end = start;
    while (end < text.length && fontFor(fonts, text, end) === font) end += characterLength(text, end);
    width += font.layout(text.slice(start, end)).advanceWidth / font.unitsPerEm;
    start = end;
  }
  return width * sizePt;
}

type Fonts = ReturnType<typeof loadedFont>[];

const fontFor = (fonts: Fonts, text: string, index: number) =>
  fonts.find((font) => font.hasGlyphForCodePoint(text.codePointAt(index) ?? 0)) ?? fonts[fonts.length - 1];

const characterLength = (text: string, index: number) => ((text.codePointAt(index) ?? 0) > 0xffff ? 2 : 1);
