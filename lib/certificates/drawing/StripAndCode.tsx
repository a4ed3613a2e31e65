import { Text, View } from "@react-pdf/renderer";
import { CODE_FACE } from "../pdfFonts";
import { ChipStripDrawing } from "./ChipStripDrawing";
import { mm, type Density } from "./page";
import { QrCode } from "./QrCode";
import { verifyPlace } from "./verifyPlace";

const STRIP_MM = 131;
const CODE_MM = 36;
/** Four modules of a code of 33 (ISO/IEC 18004: the quiet zone), counted from the rule above. */
const QUIET_PT = mm((4 * CODE_MM) / 33);

/** `words` say what to compare, or when to look again. */
type StripProps = { number?: string; fingerprint: string; verifyAddress: string; words: string; density: Density };

/** Strip, number and what to compare at the left; the way to the register at the right. */
export function StripAndCode({ number, fingerprint, verifyAddress, words, density }: StripProps) {
  return (
    <View style={{ flexDirection: "row", justifyContent: "space-between", paddingTop: QUIET_PT - density.gap }}>
      <View style={{ width: mm(STRIP_MM) }}>
        <ChipStripDrawing fingerprint={fingerprint} width={mm(STRIP_MM)} />
        {number && <Text style={{ fontFamily: CODE_FACE, fontWeight: 600, fontSize: 19, marginTop: 8 }}>{number}</Text>}
        <Text style={{ fontSize: density.small, lineHeight: 1.3, marginTop: 5 }}>{words}</Text>
      </View>
      <View style={{ width: mm(CODE_MM) }}>
        <QrCode text={verifyAddress} size={mm(CODE_MM)} />
        <Text style={{ fontSize: 8, marginTop: QUIET_PT }}>Scan, or enter the number at</Text>
        <Text style={{ fontSize: 8, fontWeight: 600, marginTop: 2 }}>{verifyPlace(verifyAddress)}</Text>
      </View>
    </View>
  );
}
