import { View } from "@react-pdf/renderer";
import { dayInWords } from "../dates";
import type { CertificateRecord } from "../record";
import { inPrint } from "./inPrint";
import { type Density } from "./page";
import { Row } from "./Row";
import { RowPair } from "./RowPair";

const SUPERVISION = {
  open: "Open book, not supervised",
  remote: "Supervised remotely",
  "on-site": "Supervised on site",
} as const;

type Covered = Pick<CertificateRecord, "scope" | "limits" | "supervision" | "identity">;

/** What the certificate covers, what it does not, and under which conditions the checks were sat. */
export function Particulars({ record, density }: { record: Covered; density: Density }) {
  return (
    <View style={{ gap: density.gap / 2.5 }}>
      <Row label="Scope" text={inPrint(record.scope)} density={density} />
      <Row label="Limits" text={inPrint(record.limits)} density={density} />
      <RowPair
        rows={[
          ["Supervision", SUPERVISION[record.supervision]],
          ["Identity", identityInWords(record.identity)],
        ]}
        density={density}
      />
    </View>
  );
}

const identityInWords = (identity: CertificateRecord["identity"]) =>
  identity
    ? `Confirmed by the ${identity.byRole}, ${dayInWords(identity.at.slice(0, 10))}`
    : "Not confirmed by a person";
