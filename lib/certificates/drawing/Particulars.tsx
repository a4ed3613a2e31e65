import { Text, View } from "@react-pdf/renderer";
import { dayInWords } from "../dates";
import type { CertificateRecord } from "../record";
import { inPrint } from "./inPrint";
import { INK, type Density } from "./page";

const LABEL_PT = 66;
const SUPERVISION = {
  open: "Open book, not supervised",
  remote: "Supervised remotely",
  "on-site": "Supervised on site",
} as const;

/** What the certificate covers, what it does not, and under which conditions the checks were sat. */
export function Particulars({ record, density }: { record: CertificateRecord; density: Density }) {
  return (
    <View style={{ gap: density.gap / 2.5 }}>
      <Row label="Scope" text={inPrint(record.scope)} density={density} />
      <Row label="Limits" text={inPrint(record.limits)} density={density} />
      <View style={{ flexDirection: "row" }}>
        <View style={half}>
          <Row label="Supervision" text={SUPERVISION[record.supervision]} density={density} />
        </View>
        <View style={half}>
          <Row label="Identity" text={identityInWords(record.identity)} density={density} />
        </View>
      </View>
    </View>
  );
}

const half = { flexGrow: 1, flexBasis: 0 } as const;

function Row({ label, text, density }: { label: string; text: string; density: Density }) {
  return (
    <View style={{ flexDirection: "row" }}>
      <Text style={{ width: LABEL_PT, fontSize: density.text, lineHeight: 1.3, color: INK.quiet }}>{label}</Text>
      <Text style={{ flex: 1, fontSize: density.text, lineHeight: 1.3 }}>{text}</Text>
    </View>
  );
}

const identityInWords = (identity: CertificateRecord["identity"]) =>
  identity
    ? `Confirmed by the ${identity.byRole}, ${dayInWords(identity.at.slice(0, 10))}`
    : "Not confirmed by a person";
