import { Document, Page, View } from "@react-pdf/renderer";
import { TEXT_FACES } from "../pdfFonts";
import type { VerificationFacts } from "../verificationFacts";
import { Cautions } from "./Cautions";
import { Foot, FOOT_HEIGHT } from "./Foot";
import { Head } from "./Head";
import { INK, PAGE, type Density } from "./page";
import { Quantities } from "./Quantities";
import { RegisterRows } from "./RegisterRows";
import { StandingHead } from "./StandingHead";
import { StripAndCode } from "./StripAndCode";
import { VerificationPanel } from "./VerificationPanel";

/** What the register said of a certificate at one moment, as a page to keep. */
export function VerificationDocument({ facts, density }: { facts: VerificationFacts; density: Density }) {
  const { entry, origin } = facts;
  const { number, demonstration, fingerprint } = entry;
  const verifyAddress = `${origin}/verify/${number}`;
  const parts = [
    <Head key="head" title="Record of a verification" {...{ number, demonstration }} />,
    <StandingHead key="standing" entry={entry} density={density} />,
    <RegisterRows key="rows" entry={entry} density={density} />,
    <Quantities key="quantities" quantities={entry.quantities} density={density} />,
    <StripAndCode
      key="strip"
      {...{ fingerprint, verifyAddress, density }}
      words={`This page keeps what the register said at one moment. Standing can change on any later day: look again at ${verifyAddress} on the day you rely on the certificate.`}
    />,
    <Cautions key="cautions" cautions={entry.cautions} density={density} />,
    <VerificationPanel key="panel" facts={facts} density={density} />,
  ];
  const at = new Date(entry.readAt);
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
