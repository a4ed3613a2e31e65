import { formatNumber } from "@/components/ui/formatNumber";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { SkySearch } from "@/lib/gnss/search/searchSky";

/** All satellites of a recording, and what only looks like one. */
export function SkyFindings({ sky }: { sky: SkySearch }) {
  return (
    <section>
      <Table caption="Satellites 1 to 32 above the threshold" showCaption>
        <thead>
          <Tr>
            <Th>PRN</Th>
            <Th figure>C/N0</Th>
            <Th figure>Doppler</Th>
            <Th figure>code phase</Th>
            <Th figure>peak to threshold</Th>
            <Th>verdict</Th>
          </Tr>
        </thead>
        <tbody>
          {sky.findings.map((finding) => (
            <Tr key={finding.prn} wash={finding.verdict === "genuine" ? null : "minus"}>
              <RowHead className="figures">{finding.prn}</RowHead>
              <Td figure>{formatNumber(finding.cn0DbHz, 1)} dB-Hz</Td>
              <Td figure>{formatNumber(finding.dopplerHz, 0, true)} Hz</Td>
              <Td figure>{formatNumber(finding.codePhaseChips, 2)} chip</Td>
              <Td figure>{formatNumber(finding.peakToThresholdDb, 1, true)} dB</Td>
              <Td>{finding.verdict === "genuine" ? "genuine" : `false peak of PRN ${finding.parentPrn}`}</Td>
            </Tr>
          ))}
        </tbody>
      </Table>
      <p className="mt-2 text-label font-normal text-ink-2 figures">
        {sky.findings.length === 0 && "None of the 32 passes the threshold. "}
        Found nine times in ten from {formatNumber(sky.sensitivityDbHz, 1)} dB-Hz.
        {sky.excision.share > 0 &&
          ` Narrow-band interference taken out: ${formatNumber(100 * sky.excision.share, 1)} % of the cells.`}
        {sky.blankedShare > 0 && ` Pulses blanked: ${formatNumber(100 * sky.blankedShare, 1)} % of the time.`}
      </p>
    </section>
  );
}
