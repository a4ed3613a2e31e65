import { View } from "@react-pdf/renderer";
import { dayInWords } from "../dates";
import type { RegisterEntry } from "../verificationFacts";
import { FactCells } from "./FactCells";
import type { Density } from "./page";
import { Particulars } from "./Particulars";
import { RowPair } from "./RowPair";
import { shortFingerprint } from "./shortFingerprint";

/** Standings that somebody set; the others follow from the days. */
const STORED = new Set(["Valid", "Suspended", "Withdrawn", "Superseded"]);

/** Days and issuer between hairlines; scope, limits, release and who decided beneath. */
export function RegisterRows({ entry, density }: { entry: RegisterEntry; density: Density }) {
  const { issuer, release, decided } = entry;
  const issuerStanding = issuer.accreditation ? `${issuer.standing}, ${issuer.accreditation}` : issuer.standing;
  const facts = [
    { label: "Effective", value: dayInWords(entry.effectiveOn), note: `Days in ${issuer.timeZone}`, share: 1.05 },
    { label: "Last day", value: dayInWords(entry.lastDay), note: "That day included", share: 1.05 },
    {
      label: `${STORED.has(entry.standing) ? entry.standing : "Entered"} since`,
      value: dayInWords(entry.standingSince.slice(0, 10)),
      note: `${entry.standingSince.slice(11, 19)} UTC`,
      share: 1.05,
    },
    { label: "Issuer", value: issuer.name, note: issuerStanding, share: 1.4 },
  ];
  const line = decided.outsideLine ? "outside the candidate's line" : "inside the candidate's line";
  const print = shortFingerprint(release.fingerprint);
  return (
    <View style={{ gap: density.gap }}>
      <FactCells facts={facts} density={density} />
      <View style={{ gap: density.gap / 2.5 }}>
        <Particulars record={entry} density={density} />
        <RowPair
          rows={[
            ["Release", `${release.code}, ${release.number} (${print})`],
            ["Decided by", `A decider, ${line}, ${unbroken(dayInWords(decided.at.slice(0, 10)))}`],
          ]}
          density={density}
        />
      </View>
    </View>
  );
}

/** A day stays on one line. */
const unbroken = (day: string) => day.replaceAll(" ", "\u00a0");
