import { Text, View } from "@react-pdf/renderer";
import { instantInWords } from "../dates";
import { PLATE_FACE } from "../pdfFonts";
import type { CertificateFace } from "./CertificateDocument";
import { INK, type Density } from "./page";
import { verifyPlace } from "./verifyPlace";

/** Who decided, and by what the file is signed: a decider signs in afresh and has no key, the register has one. */
export function SignaturePanel({ face, density }: { face: CertificateFace; density: Density }) {
  const { decided } = face.record;
  const line = decided.outsideLine ? "outside the candidate's line" : "inside the candidate's line";
  return (
    <View style={{ flexDirection: "row", borderWidth: 1, borderColor: INK.ink }}>
      <Cell
        title="Decided"
        density={density}
        rows={[
          ["Decided by", `${decided.by}, ${line}`],
          ["At", instantInWords(decided.at)],
          ["Signed in afresh", instantInWords(decided.signedAfreshAt)],
        ]}
      />
      <View style={{ width: 1, backgroundColor: INK.ink }} />
      <Cell
        title="Signed by the register"
        density={density}
        rows={[
          ["Signature", "in this file, over all of it"],
          ["Key", "ES256, its certificate in this file"],
          ["Standing", `read it at ${verifyPlace(face.verifyAddress)}`],
        ]}
      />
    </View>
  );
}

function Cell({ title, rows, density }: { title: string; rows: [string, string][]; density: Density }) {
  return (
    <View style={{ flex: 1, paddingVertical: density.panel, paddingHorizontal: 11 }}>
      <Text
        style={{
          fontFamily: PLATE_FACE,
          fontWeight: 700,
          fontSize: density.text + 0.5,
          letterSpacing: -0.2,
          marginBottom: 3,
        }}
      >
        {title}
      </Text>
      {rows.map(([label, value]) => (
        <View key={label} style={{ flexDirection: "row", marginTop: 2 }}>
          <Text style={{ width: 78, fontSize: density.small, color: INK.quiet }}>{label}</Text>
          <Text style={{ flex: 1, fontSize: density.small, fontWeight: 600 }}>{value}</Text>
        </View>
      ))}
    </View>
  );
}
