import { dayInWords } from "../dates";
import type { CertificateRecord } from "../record";
import { FactCells } from "./FactCells";
import type { Density } from "./page";
import { shortFingerprint } from "./shortFingerprint";

/** The four facts asked first of a certificate. */
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
  return <FactCells facts={facts} density={density} />;
}
