import { SkyDial } from "@/components/plots/SkyDial";
import { hiddenPath, skyPlace } from "@/components/plots/skyGeometry";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";

export type SkyData = {
  sky: { prn: number; azimuthDeg: number; elevationDeg: number }[];
  wall: { fromAzimuthDeg: number; toAzimuthDeg: number; topElevationDeg: number };
  report: { prn: number; tracked: boolean; cn0DbHz: number | null }[];
};

/** Where each satellite stands, what the wall hides, and what the receiver says of it. */
export function SkyAndReport({ data }: { data: SkyData }) {
  return (
    <div className="grid gap-6 tablet:grid-cols-[300px_1fr]">
      <section>
        <SectionHead title="Sky plot" note="north up, zenith in the middle" level={3} />
        <SkyPlot data={data} />
      </section>
      <section>
        <SectionHead title="Receiver report" level={3} />
        <Table caption="Sky and receiver report, satellite by satellite">
          <thead>
            <tr>
              <Th>Satellite</Th>
              <Th figure>Azimuth</Th>
              <Th figure>Elevation</Th>
              <Th figure>Reported C/N0</Th>
            </tr>
          </thead>
          <tbody>
            {data.sky.map(({ prn, azimuthDeg, elevationDeg }) => {
              const report = data.report.find((one) => one.prn === prn);
              return (
                <Tr key={prn}>
                  <RowHead>PRN {prn}</RowHead>
                  <Td figure>{azimuthDeg}°</Td>
                  <Td figure>{elevationDeg}°</Td>
                  <Td figure>{report?.tracked ? `${report.cn0DbHz} dB-Hz` : "not tracked"}</Td>
                </Tr>
              );
            })}
          </tbody>
        </Table>
      </section>
    </div>
  );
}

function SkyPlot({ data: { sky, wall } }: { data: SkyData }) {
  const summary = `Sky plot of ${sky.length} satellites; a wall from azimuth ${wall.fromAzimuthDeg}° to ${wall.toAzimuthDeg}° up to ${wall.topElevationDeg}°. The same values stand in the table beside it.`;
  const { fromAzimuthDeg: fromDeg, toAzimuthDeg: toDeg, topElevationDeg: topDeg } = wall;
  const hidden = hiddenPath([{ fromDeg, toDeg, topDeg }]);
  return (
    <SkyDial summary={summary} under={<path d={hidden} fill="var(--heat-1)" stroke="var(--ink)" strokeWidth="1.25" />}>
      {sky.map(({ prn, azimuthDeg, elevationDeg }) => {
        const [x, y] = skyPlace(azimuthDeg, elevationDeg);
        const side = labelSide(sky, prn);
        return (
          <g key={prn}>
            <rect x={x - 4} y={y - 4} width="8" height="8" fill="var(--plus)" stroke="var(--sheet)" strokeWidth="1.5" />
            <text
              x={x + 8 * side}
              y={y + 4.5}
              textAnchor={side > 0 ? "start" : "end"}
              fontSize="13"
              fontWeight="600"
              fill="var(--ink)"
              stroke="var(--sheet)"
              strokeWidth="3"
              paintOrder="stroke"
            >
              {prn}
            </text>
          </g>
        );
      })}
    </SkyDial>
  );
}

const LABEL = { width: 26, height: 16 };

/** 1: number at the right of its square; -1: at the left, where the right is taken by another square or its number. */
function labelSide(sky: SkyData["sky"], prn: number): 1 | -1 {
  const places = sky.map((one) => ({ prn: one.prn, at: skyPlace(one.azimuthDeg, one.elevationDeg) }));
  const [x, y] = places.find((one) => one.prn === prn)!.at;
  const crowded = places.some(({ prn: other, at: [otherX, otherY] }) => {
    const right = otherX - x;
    return (right > 0 || (right === 0 && other > prn)) && right < LABEL.width && Math.abs(otherY - y) < LABEL.height;
  });
  return crowded ? -1 : 1;
}
