import { View } from "@react-pdf/renderer";
import { dayInWords } from "../dates";
import type { CertificateRecord } from "../record";
import { SUPERVISION_IN_WORDS } from "../supervision";
import { inPrint } from "./inPrint";
import { type Density } from "./page";
import { Row } from "./Row";
import { RowPair } from "./RowPair";

type Covered = Pick<CertificateRecord, "scope" | "limits" | "supervision" | "identity">;

/** What the certificate covers, what it does not, and under which conditions the checks were sat. */
export function Particulars({ record, density }: { record: Covered; density: Density }) {
  return (
    <View style={{ gap: density.gap / 2.5 }}>
      <Row label="Scope" text={inPrint(record.scope)} density={density} />
      <Row label="Limits" text={inPrint(record.limits)} density={density} />
      <RowPair
        rows={[
          ["Supervision", SUPERVISION_IN_WORDS[record.supervision]],
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
