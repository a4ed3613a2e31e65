import path from "node:path";
import { Font } from "@react-pdf/renderer";

/** Order of fallback, tried character by character. Plate and code faces fall back to the text faces. */
export const TEXT_FACES = ["Atkinson Hyperlegible Next", "Fira Sans", "DejaVu Sans"];
export const PLATE_FACE = "B612";
export const CODE_FACE = "Commit Mono";

const FILES: readonly [family: string, weight: number, file: string][] = [
  [TEXT_FACES[0], 400, "AtkinsonHyperlegibleNext_400Regular.ttf"],
  [TEXT_FACES[0], 600, "AtkinsonHyperlegibleNext_600SemiBold.ttf"],
  [TEXT_FACES[0], 700, "AtkinsonHyperlegibleNext_700Bold.ttf"],
  [TEXT_FACES[1], 400, "FiraSans_500Medium.ttf"],
  [TEXT_FACES[1], 700, "FiraSans_700Bold.ttf"],
  [TEXT_FACES[2], 400, "DejaVuSans.ttf"],
  [TEXT_FACES[2], 700, "DejaVuSans-Bold.ttf"],
  [PLATE_FACE, 700, "b612-latin-700-normal.woff"],
  [CODE_FACE, 600, "commit-mono-latin-600-normal.woff"],
];

/** What is used of a loaded font; the layout engine hands it out untyped. */
export type LoadedFont = {
  unitsPerEm: number;
  hasGlyphForCodePoint(codePoint: number): boolean;
  layout(text: string): { advanceWidth: number };
};

let loading: Promise<void> | null = null;

/** Registers and reads the font files once in a process. */
export function loadPdfFonts(): Promise<void> {
  return (loading ??= readFonts());
}

async function readFonts(): Promise<void> {
  for (const [family, fontWeight, file] of FILES) {
    Font.register({ family, fontWeight, src: path.join(process.cwd(), "fonts", file) });
  }
  // The default breaks words, names among them, at guessed syllables.
  Font.registerHyphenationCallback((word) => [word]);
  await Promise.all(FILES.map(([fontFamily, fontWeight]) => Font.load({ fontFamily, fontWeight })));
}

/** A registered face at the weight nearest to the one asked for; call loadPdfFonts first. */
export function loadedFont(fontFamily: string, fontWeight: number): LoadedFont {
  const font = Font.getFont({ fontFamily, fontWeight }).data as LoadedFont | null;
  if (!font) throw new Error(`loadedFont: ${fontFamily} ${fontWeight} is not loaded`);
  return font;
}
