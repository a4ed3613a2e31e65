import { Path, Svg, Text, View } from "@react-pdf/renderer";
import { CODE_FACE, PLATE_FACE } from "../pdfFonts";
import { INK } from "./page";

const MARK_PT = 26;
const NAME_PT = 19;

type HeadProps = { title: string; number: string; demonstration: boolean };

/** Mark and name at the left, what the paper is and its number at the right, and whether it is a demonstration. */
export function Head({ title, number, demonstration }: HeadProps) {
  return (
    <View>
      <View style={{ flexDirection: "row", justifyContent: "space-between" }}>
        <View style={{ flexDirection: "row", alignItems: "flex-end" }}>
          <Mark />
          <Text
            style={{
              fontFamily: PLATE_FACE,
              fontWeight: 700,
              fontSize: NAME_PT,
              letterSpacing: -0.02 * NAME_PT,
              marginLeft: 9,
              marginBottom: 1.2,
            }}
          >
            Lagmark
          </Text>
        </View>
        <View style={{ alignItems: "flex-end" }}>
          <Text style={{ fontSize: 10 }}>{title}</Text>
          <Text style={{ fontFamily: CODE_FACE, fontWeight: 600, fontSize: 11, marginTop: 3 }}>{number}</Text>
        </View>
      </View>
      {demonstration && <Demonstration />}
    </View>
  );
}

/** The mark on its 32-unit grid: peak and one chip above the line, one chip below. */
function Mark() {
  return (
    <Svg width={MARK_PT} height={MARK_PT} viewBox="0 0 32 32">
      <Path d="M10.4 20.6L16 0l5.6 20.6z" fill={INK.plus} />
      <Path d="M1.5 14.4h6.6v6.2H1.5z" fill={INK.plus} />
      <Path d="M23.9 23.8h6.6V30h-6.6z" fill={INK.minus} />
      <Path d="M0 20.6h32v3.2H0z" fill={INK.ink} />
    </Svg>
  );
}

function Demonstration() {
  return (
    <View
      style={{
        flexDirection: "row",
        alignItems: "center",
        borderWidth: 2,
        borderColor: INK.ink,
        marginTop: 8,
        paddingVertical: 4,
        paddingHorizontal: 9,
      }}
    >
      <Text style={{ fontFamily: PLATE_FACE, fontWeight: 700, fontSize: 14 }}>Demonstration</Text>
      <Text style={{ fontSize: 9, marginLeft: 12 }}>
        Made by a demonstration installation and signed with a demonstration key. It certifies nobody.
      </Text>
    </View>
  );
}
