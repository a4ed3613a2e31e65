import { Rect, Svg, Text, View } from "@react-pdf/renderer";
import { chipBand } from "../chipStrip";
import { CODE_FACE } from "../pdfFonts";
import { INK, PAGE } from "./page";

const LINE_PT = 0.75;
/** Band and figures with a little air above them. */
export const FOOT_HEIGHT = 28;

/** All 256 chips of the fingerprint on one line and its 64 figures beneath. */
export function Foot({ fingerprint }: { fingerprint: string }) {
  const band = chipBand(fingerprint);
  const u = PAGE.width / band.width;
  return (
    <View fixed style={{ position: "absolute", left: PAGE.side, bottom: PAGE.foot, width: PAGE.width }}>
      <Svg width={PAGE.width} height={band.height * u} viewBox={`0 0 ${PAGE.width} ${band.height * u}`}>
        {band.chips.map((chip) => (
          <Rect
            key={chip.x}
            x={chip.x * u}
            y={chip.y * u}
            width={chip.width * u}
            height={chip.height * u}
            fill={chip.bit === 0 ? INK.plus : INK.minus}
          />
        ))}
        <Rect x={0} y={band.line * u - LINE_PT / 2} width={PAGE.width} height={LINE_PT} fill={INK.ink} />
      </Svg>
      <View style={{ flexDirection: "row", justifyContent: "space-between", marginTop: 3 }}>
        <Text style={code}>SHA-256</Text>
        <Text style={code}>{(fingerprint.toUpperCase().match(/.{8}/g) ?? []).join(" ")}</Text>
        <Text style={{ fontSize: 7 }} render={({ pageNumber, totalPages }) => `Page ${pageNumber} of ${totalPages}`} />
      </View>
    </View>
  );
}

const code = { fontFamily: CODE_FACE, fontWeight: 600, fontSize: 7, color: INK.quiet } as const;
