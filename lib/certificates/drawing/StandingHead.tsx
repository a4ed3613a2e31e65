import { Text, View } from "@react-pdf/renderer";
import { dayInWords } from "../dates";
import { CODE_FACE, PLATE_FACE } from "../pdfFonts";
import { standingInWords } from "../standingInWords";
import type { RegisterEntry } from "../verificationFacts";
import { inPrint } from "./inPrint";
import { INK, type Density } from "./page";

const LINE_PT = 5;

/** The answer first: the standing that the register gave on that day, standing on the line, and of what. */
export function StandingHead({ entry, density }: { entry: RegisterEntry; density: Density }) {
  const size = 0.9 * density.name;
  return (
    <View>
      <Text style={{ fontSize: density.text + 2 }}>{`Standing in the register on ${dayInWords(entry.today)}`}</Text>
      <Text style={{ fontFamily: PLATE_FACE, fontWeight: 700, fontSize: size, letterSpacing: -0.02 * size }}>
        {entry.standing}
      </Text>
      <View style={{ height: LINE_PT, marginTop: 2, backgroundColor: INK.ink }} />
      <Text style={{ fontSize: density.text + 1, fontWeight: 600, lineHeight: 1.3, marginTop: density.gap * 0.8 }}>
        {standingInWords(entry)}
      </Text>
      <View style={{ flexDirection: "row", alignItems: "baseline", gap: 4, marginTop: density.gap }}>
        <Text style={{ fontSize: density.text + 2 }}>Certificate</Text>
        <Text style={{ fontFamily: CODE_FACE, fontWeight: 600, fontSize: density.text + 2, marginTop: -2 }}>
          {entry.number}
        </Text>
        <Text style={{ fontSize: density.text + 2 }}>of</Text>
      </View>
      <Text style={{ fontSize: density.title, fontWeight: 700, lineHeight: 1.25 }}>{entry.holder}</Text>
      <Text style={{ fontSize: density.text + 2, lineHeight: 1.3 }}>
        {`in ${inPrint(entry.scheme.title)}, scheme ${inPrint(entry.scheme.code)}, ${inPrint(entry.scheme.edition)}`}
      </Text>
    </View>
  );
}
