import { Text, View } from "@react-pdf/renderer";
import { dayInWords } from "../dates";
import type { CertificateRecord } from "../record";
import { INK, type Density } from "./page";

/** The four facts asked first, side by side between two hairlines. */
export function Facts({ record, density }: { record: CertificateRecord; density: Density }) {
  const { issuer, release } = record;
  const standing = issuer.accreditation ? `${issuer.standing}, ${issuer.accreditation}` : issuer.standing;
  const facts = [
    { label: "Effective", value: dayInWords(record.effectiveOn), note: `Days in ${issuer.timeZone}`, share: 0.9 },
    { label: "Last day", value: dayInWords(record.lastDay), note: "That day included", share: 0.9 },
    { label: "Issuer", value: issuer.name, note: standing, share: 1.75 },
    {
      label: "Release",
      value: `${release.code}, ${release.number}`,
      note: shortFingerprint(release.fingerprint),
      share: 0.95,
    },
  ];
  return (
    <View style={{ flexDirection: "row", borderTopWidth: 0.75, borderBottomWidth: 0.75, borderColor: INK.rule }}>
      {facts.map(({ label, value, note, share }, index) => (
        <View key={label} style={{ ...cell(index, density), flexGrow: share, flexBasis: 0 }}>
          <Text style={{ fontSize: density.small, color: INK.quiet }}>{label}</Text>
          <Text style={{ fontSize: density.text + 0.5, fontWeight: 600, marginTop: 1.5 }}>{value}</Text>
          <Text style={{ fontSize: density.small, color: INK.quiet, marginTop: 1.5 }}>{note}</Text>
        </View>
      ))}
    </View>
  );
}

const cell = (index: number, density: Density) => ({
  paddingVertical: density.panel - 2,
  paddingLeft: index === 0 ? 0 : 10,
  paddingRight: 8,
  borderLeftWidth: index === 0 ? 0 : 0.75,
  borderColor: INK.rule,
});

const shortFingerprint = (fingerprint: string) => {
  const figures = fingerprint.slice(0, 16).toUpperCase().match(/.{4}/g) ?? [];
  return figures.join(" ");
};
