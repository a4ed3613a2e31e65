import { formatNumber } from "@/components/ui/formatNumber";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { FalsePeak } from "@/lib/gnss/falseLock";

const SHOWN = 12;

/** The highest false peaks in figures. */
export function FalsePeakTable({ peaks }: { peaks: readonly FalsePeak[] }) {
  const more = peaks.length - SHOWN;
  return (
    <>
      <Table caption="False peaks, highest first; lag after the strong satellite’s code" showCaption>
        <thead>
          <Tr>
            <Th>Doppler</Th>
            <Th figure>lag</Th>
            <Th figure>apparent C/N0</Th>
            <Th figure>chance</Th>
          </Tr>
        </thead>
        <tbody>
          {peaks.slice(0, SHOWN).map(({ dopplerHz, lagChips, apparentCn0DbHz, detection }) => (
            <Tr key={`${dopplerHz}/${lagChips}`}>
              <RowHead className="whitespace-nowrap figures">{formatNumber(dopplerHz, 0, true)} Hz</RowHead>
              <Td figure>{lagChips} chip</Td>
              <Td figure>{formatNumber(apparentCn0DbHz, 1)} dB-Hz</Td>
              <Td figure>{formatNumber(100 * detection, 1)} %</Td>
            </Tr>
          ))}
        </tbody>
      </Table>
      {more > 0 && (
        <p className="mt-2 text-label font-normal text-ink-2">{more} more lie within 3 dB of the highest.</p>
      )}
    </>
  );
}
