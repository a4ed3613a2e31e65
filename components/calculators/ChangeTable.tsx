import { formatNumber } from "@/components/ui/formatNumber";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { changesAt, meanChangeDb } from "@/lib/gnss/sky/cn0Change";
import { utcOf, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";

/** C/N0 of the minutes before and after the cursor, satellite by satellite. */
export function ChangeTable({ log, reading }: { log: ReceiverLog; reading: number }) {
  const changes = changesAt(log, reading);
  const utc = utcOf(log, reading);
  if (changes.length === 0)
    return <p className="text-dense text-ink-2">{`No satellite is tracked through both minutes round ${utc}.`}</p>;
  return (
    <div className="grid gap-2">
      <p className="text-dense text-ink-2">
        Mean C/N0 of the minute that ends 20 s before the cursor and of the minute that begins 20 s after it, in dB-Hz.
      </p>
      <Table caption={`Mean C/N0 before and after ${utc} UTC`}>
        <thead>
          <tr>
            <Th>Satellite</Th>
            <Th figure>Before</Th>
            <Th figure>After</Th>
            <Th figure>Change, dB</Th>
          </tr>
        </thead>
        <tbody>
          {changes.map(({ prn, beforeDbHz, afterDbHz }) => (
            <Tr key={prn}>
              <RowHead>{`PRN ${prn}`}</RowHead>
              <Td figure>{formatNumber(beforeDbHz, 1)}</Td>
              <Td figure>{formatNumber(afterDbHz, 1)}</Td>
              <Td figure>{formatNumber(afterDbHz - beforeDbHz, 1, true)}</Td>
            </Tr>
          ))}
          <Tr>
            <RowHead>Mean</RowHead>
            <Td figure>{null}</Td>
            <Td figure>{null}</Td>
            <Td figure>{formatNumber(meanChangeDb(log, reading), 1, true)}</Td>
          </Tr>
        </tbody>
      </Table>
    </div>
  );
}
