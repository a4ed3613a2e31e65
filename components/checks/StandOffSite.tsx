import { PathLossCurve } from "@/components/calculators/PathLossCurve";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { formatQuantity } from "@/lib/checks/formatQuantity";

export type StandOffData = {
  distanceM: number;
  exponent: number;
  screenDb: number;
  satellites: { prn: number; elevationDeg: number; cn0DbHz: number }[];
};

/** What the receiver had before the interference, and what the path takes at any distance. */
export function StandOffSite({ data }: { data: StandOffData }) {
  return (
    <div className="grid gap-8">
      <section>
        <SectionHead title="Satellites without interference" level={3} />
        <Table caption="Satellites without interference">
          <thead>
            <tr>
              <Th>Satellite</Th>
              <Th figure>Elevation</Th>
              <Th figure>C/N0</Th>
            </tr>
          </thead>
          <tbody>
            {data.satellites.map(({ prn, elevationDeg, cn0DbHz }) => (
              <Tr key={prn}>
                <RowHead>PRN {prn}</RowHead>
                <Td figure>{elevationDeg}°</Td>
                <Td figure>{formatQuantity(cn0DbHz, "dB-Hz", 1)}</Td>
              </Tr>
            ))}
          </tbody>
        </Table>
      </section>
      <section>
        <SectionHead
          title="Loss of this path"
          note="with what stands between; begins at the distance given"
          level={3}
        />
        <PathLossCurve exponent={data.exponent} screenDb={data.screenDb} startM={data.distanceM} />
      </section>
    </div>
  );
}
