"use client";
import { useMemo, useState } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import { Key } from "@/components/ui/Key";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { bandMeans, utcOf, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";

/** Mean C/N0 by elevation over the log, without the readings that a person leaves out. */
export function ElevationMeans({ log, reading }: { log: ReceiverLog; reading: number }) {
  const [ends, setEnds] = useState<{ from: number; to: number } | null>(null);
  const wrong = ends !== null && ends.from > ends.to;
  const means = useMemo(() => bandMeans(log, ends && ends.from <= ends.to ? [ends.from, ends.to] : null), [log, ends]);
  const last = log.readings - 1;
  const said = ends
    ? `Left out: ${utcOf(log, ends.from)} to ${utcOf(log, ends.to)} UTC.`
    : "The whole log counts. Move the cursor to leave readings out.";
  return (
    <div className="grid gap-3">
      <div className="flex flex-wrap gap-3">
        <Key size="small" onClick={() => setEnds({ from: reading, to: ends?.to ?? last })}>
          {`Leave out from ${utcOf(log, reading)}`}
        </Key>
        <Key size="small" onClick={() => setEnds({ from: ends?.from ?? 0, to: reading })}>
          {`Leave out to ${utcOf(log, reading)}`}
        </Key>
        <Key size="small" reason={ends ? null : "nothing is left out"} onClick={() => setEnds(null)}>
          Leave nothing out
        </Key>
      </div>
      <p role="status" className="text-dense text-ink-2 figures">
        {wrong ? `${said} The end lies before the beginning, so nothing is left out.` : said}
      </p>
      <Table caption="Mean C/N0 by elevation">
        <thead>
          <tr>
            <Th>Elevation</Th>
            <Th figure>Readings</Th>
            <Th figure>Mean C/N0, dB-Hz</Th>
          </tr>
        </thead>
        <tbody>
          {[...means].reverse().map(({ fromDeg, toDeg, readings, meanDbHz }) => (
            <Tr key={fromDeg}>
              <RowHead>{`${fromDeg}° to ${toDeg}°`}</RowHead>
              <Td figure>{formatNumber(readings)}</Td>
              <Td figure>{formatNumber(meanDbHz, 1)}</Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}
