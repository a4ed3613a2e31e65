import { Document, Page, View } from "@react-pdf/renderer";
import type { CertificateRecord } from "../record";
import { TEXT_FACES } from "../pdfFonts";
import { Cautions } from "./Cautions";
import { Competence } from "./Competence";
import { Facts } from "./Facts";
import { Foot, FOOT_HEIGHT } from "./Foot";
import { Head } from "./Head";
import { Holder } from "./Holder";
import { INK, PAGE, type Density } from "./page";
import { Particulars } from "./Particulars";
import { Quantities } from "./Quantities";
import { SignaturePanel } from "./SignaturePanel";
import { StripAndCode } from "./StripAndCode";

export type CertificateFace = { record: CertificateRecord; fingerprint: string; verifyAddress: string };

/** The certificate as one A4 page; set too loosely it flows on to a second, which the caller looks for. */
export function CertificateDocument({ face, density }: { face: CertificateFace; density: Density }) {
  const { record, fingerprint, verifyAddress } = face;
  const parts = [
    <Head key="head" title="Certificate of competence" number={record.number} demonstration={record.demonstration} />,
    <Holder key="holder" name={record.holder.name} density={density} />,
    <Competence key="competence" record={record} density={density} />,
    <Facts key="facts" record={record} density={density} />,
    <Particulars key="particulars" record={record} density={density} />,
    <Quantities key="quantities" quantities={record.quantities} density={density} />,
    <StripAndCode
      key="strip"
      {...{ number: record.number, fingerprint, verifyAddress, density }}
      words="Hold this page beside the screen: name, module, number and every chip must agree. A forger can copy chips. Only the register tells whether the certificate holds today: read it on the day you rely on it."
    />,
    <Cautions key="cautions" cautions={record.cautions} density={density} />,
    <SignaturePanel key="panel" face={face} density={density} />,
  ];
  // Dates come from the record: the same record gives the same bytes.
  const at = new Date(record.decided.at);
  return (
    <Document
      language="en"
      pdfVersion="1.7"
      creationDate={at}
      modificationDate={at}
      producer="Lagmark"
      creator="Lagmark"
    >
      <Page size="A4" style={{ ...page, paddingBottom: PAGE.foot + FOOT_HEIGHT + density.gap }}>
        {parts.map((part, index) => (
          <View key={part.key} wrap={false} style={{ flexShrink: 0, marginTop: index === 0 ? 0 : density.gap }}>
            {part}
          </View>
        ))}
        <Foot fingerprint={fingerprint} />
      </Page>
    </Document>
  );
}

const page = {
  paddingTop: PAGE.head,
  paddingHorizontal: PAGE.side,
  justifyContent: "space-between",
  fontFamily: TEXT_FACES,
  fontSize: 10,
  color: INK.ink,
} as const;
