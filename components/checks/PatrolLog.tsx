import { BearingWork } from "@/components/calculators/BearingWork";
import type { Reading } from "@/components/calculators/reading";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { formatQuantity } from "@/lib/checks/formatQuantity";

export type PatrolData = {
  log: {
    stop: number;
    timeUtc: string;
    eastM: number;
    northM: number;
    bearingDeg: number | null;
    spreadDeg: number | null;
    levelDbm: number | null;
  }[];
};

/** The log as it was written, and its bearings on a map to work at. */
export function PatrolLog({ data: { log }, onTake }: { data: PatrolData; onTake?: (reading: Reading) => void }) {
  const stops = log.map(({ stop, eastM, northM, bearingDeg, spreadDeg }) => ({
    stop,
    eastM,
    northM,
    line: bearingDeg === null || spreadDeg === null ? null : { eastM, northM, bearingDeg, sigmaDeg: spreadDeg },
  }));
  return (
    <div className="grid gap-8">
      <section>
        <SectionHead title="Map" note="north up" level={3} />
        <BearingWork stops={stops} onTake={onTake} />
      </section>
      <section>
        <SectionHead title="Patrol log" level={3} />
        <Table caption="Patrol log" fixedFirst>
          <thead>
            <tr>
              <Th>Stop</Th>
              <Th>UTC</Th>
              <Th figure>East</Th>
              <Th figure>North</Th>
              <Th figure>Bearing</Th>
              <Th figure>Level</Th>
            </tr>
          </thead>
          <tbody>
            {log.map(({ stop, timeUtc, eastM, northM, bearingDeg, spreadDeg, levelDbm }) => (
              <Tr key={stop}>
                <RowHead>{stop}</RowHead>
                <Td>{timeUtc}</Td>
                <Td figure>{formatQuantity(eastM, "m", 0)}</Td>
                <Td figure>{formatQuantity(northM, "m", 0)}</Td>
                <Td figure>{bearingDeg === null ? "nothing heard" : `${bearingDeg}° ± ${spreadDeg}°`}</Td>
                <Td figure>{levelDbm === null ? "–" : formatQuantity(levelDbm, "dBm", 0)}</Td>
              </Tr>
            ))}
          </tbody>
        </Table>
      </section>
    </div>
  );
}
