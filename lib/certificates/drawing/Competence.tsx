import { Text, View } from "@react-pdf/renderer";
import { loadedFont, PLATE_FACE } from "../pdfFonts";
import type { CertificateRecord } from "../record";
import { inPrint } from "./inPrint";
import { type Density } from "./page";

/** What the holder is competent in: the scheme's title, its code and edition as text. */
export function Competence({ record, density }: { record: CertificateRecord; density: Density }) {
  const { scheme } = record;
  const title = inPrint(scheme.title);
  return (
    <View>
      <Text style={{ fontSize: density.text + 2 }}>is competent in</Text>
      <Text
        style={{
          ...titleFace(title),
          fontWeight: 700,
          fontSize: density.title,
          letterSpacing: -0.018 * density.title,
          lineHeight: 1.25,
        }}
      >
        {title}
      </Text>
      <Text style={{ fontSize: density.text, lineHeight: 1.3 }}>
        {/* One string: between two the layout engine may break a line and put a hyphen. */}
        {`Scheme ${inPrint(scheme.code)}, ${inPrint(scheme.edition)}`}
      </Text>
    </View>
  );
}

/** A word half in one face and half in another looks like a forgery, so a title the plate face cannot spell is set in the text face. */
function titleFace(title: string): { fontFamily?: string } {
  const plate = loadedFont(PLATE_FACE, 700);
  const spelt = [...title].every((character) => plate.hasGlyphForCodePoint(character.codePointAt(0) ?? 0));
  return spelt ? { fontFamily: PLATE_FACE } : {};
}
