import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";

export type SkyData = {
  sky: { prn: number; azimuthDeg: number; elevationDeg: number }[];
  wall: { fromAzimuthDeg: number; toAzimuthDeg: number; topElevationDeg: number };
  report: { prn: number; tracked: boolean; cn0DbHz: number | null }[];
};

const SIZE = 300;
const RADIUS = 118;
const CENTRE = SIZE / 2;

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
  return (
    <svg
      viewBox={`0 0 ${SIZE} ${SIZE}`}
      width={SIZE}
      className="mt-2 block h-auto max-w-full"
      role="img"
      aria-label={summary}
    >
      <path d={wallPath(wall)} fill="var(--heat-1)" stroke="var(--ink)" strokeWidth="1.25" />
      {[0, 30, 60].map((elevation) => (
        <circle
          key={elevation}
          cx={CENTRE}
          cy={CENTRE}
          r={radius(elevation)}
          fill="none"
          stroke={elevation === 0 ? "var(--ink)" : "var(--rule)"}
          strokeWidth={elevation === 0 ? 1.25 : 0.75}
        />
      ))}
      {[30, 60].map((elevation) => (
        <text key={elevation} x={CENTRE + 3} y={CENTRE - radius(elevation) + 12} fontSize="11" fill="var(--ink-3)">
          {elevation}°
        </text>
      ))}
      {(["N", "E", "S", "W"] as const).map((name, quarter) => {
        const [x, y] = place(quarter * 90, -9);
        return (
          <text key={name} x={x} y={y + 4} fontSize="12" fontWeight="600" textAnchor="middle" fill="var(--ink-2)">
            {name}
          </text>
        );
      })}
      {sky.map(({ prn, azimuthDeg, elevationDeg }) => {
        const [x, y] = place(azimuthDeg, elevationDeg);
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
    </svg>
  );
}

const LABEL = { width: 26, height: 16 };

/** 1: number at the right of its square; -1: at the left, where the right is taken by another square or its number. */
function labelSide(sky: SkyData["sky"], prn: number): 1 | -1 {
  const places = sky.map((one) => ({ prn: one.prn, at: place(one.azimuthDeg, one.elevationDeg) }));
  const [x, y] = places.find((one) => one.prn === prn)!.at;
  const crowded = places.some(({ prn: other, at: [otherX, otherY] }) => {
    const right = otherX - x;
    return (right > 0 || (right === 0 && other > prn)) && right < LABEL.width && Math.abs(otherY - y) < LABEL.height;
  });
  return crowded ? -1 : 1;
}

const radius = (elevationDeg: number) => (RADIUS * (90 - elevationDeg)) / 90;

function place(azimuthDeg: number, elevationDeg: number): [number, number] {
  const angle = (azimuthDeg * Math.PI) / 180;
  return [CENTRE + radius(elevationDeg) * Math.sin(angle), CENTRE - radius(elevationDeg) * Math.cos(angle)];
}

/** The ring sector from the horizon up to the wall's top; it may cross north. */
function wallPath({ fromAzimuthDeg, toAzimuthDeg, topElevationDeg }: SkyData["wall"]): string {
  const span = (toAzimuthDeg - fromAzimuthDeg + 360) % 360;
  const steps = Array.from({ length: span + 1 }, (_, step) => fromAzimuthDeg + step);
  const points = [
    ...steps.map((azimuth) => place(azimuth, 0)),
    ...steps.reverse().map((azimuth) => place(azimuth, topElevationDeg)),
  ];
  return `M${points.map(([x, y]) => `${x.toFixed(1)} ${y.toFixed(1)}`).join("L")}Z`;
}
