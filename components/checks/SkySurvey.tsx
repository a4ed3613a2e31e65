import { SkyDial } from "@/components/plots/SkyDial";
import { hiddenPath, SKY_CENTRE, skyPlace, skyRadius, type SkyPiece } from "@/components/plots/skyGeometry";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { RoofPlan, type RoofData } from "./RoofPlan";

export type SkySurveyData = Omit<RoofData, "positions"> & {
  maskDeg: number;
  positions: { id: string; eastM: number; northM: number; horizon: SkyPiece[] }[];
};

/** The roof on a plan, and the horizon of each position that was surveyed on it. */
export function SkySurvey({ data }: { data: SkySurveyData }) {
  return (
    <div className="grid gap-8">
      <RoofPlan data={data} />
      {data.positions.map(({ id, horizon }) => (
        <section key={id} className="grid gap-x-6 gap-y-3 tablet:grid-cols-[300px_1fr]">
          <div>
            <SectionHead title={`Horizon of position ${id}`} note="north up, zenith in the middle" level={3} />
            <Mask id={id} horizon={horizon} maskDeg={data.maskDeg} />
          </div>
          <Table caption={`Pieces of the horizon of position ${id}`} showCaption>
            <thead>
              <tr>
                <Th>Azimuth from</Th>
                <Th figure>to</Th>
                <Th figure>Top elevation</Th>
              </tr>
            </thead>
            <tbody>
              {horizon.map(({ fromDeg, toDeg, topDeg }) => (
                <Tr key={fromDeg}>
                  <RowHead className="figures">{fromDeg}°</RowHead>
                  <Td figure>{toDeg}°</Td>
                  <Td figure>{topDeg}°</Td>
                </Tr>
              ))}
            </tbody>
          </Table>
        </section>
      ))}
    </div>
  );
}

function Mask({ id, horizon, maskDeg }: { id: string; horizon: SkyPiece[]; maskDeg: number }) {
  const highest = horizon.reduce((a, b) => (b.topDeg > a.topDeg ? b : a));
  const summary = `Sky plot of position ${id}: ${horizon.length} pieces of horizon, the highest ${highest.topDeg}° from azimuth ${highest.fromDeg}° to ${highest.toDeg}°. The same values stand in the table beside it.`;
  const quarters = [0, 90, 180, 270].map((azimuth) => {
    const [x, y] = skyPlace(azimuth, 0);
    return `M${SKY_CENTRE} ${SKY_CENTRE}L${x.toFixed(1)} ${y.toFixed(1)}`;
  });
  return (
    <SkyDial
      summary={summary}
      under={<path d={hiddenPath(horizon)} fill="var(--heat-2)" stroke="var(--ink)" strokeWidth="0.75" />}
    >
      <path d={quarters.join("")} stroke="var(--rule-strong)" strokeWidth="0.75" />
      <circle
        cx={SKY_CENTRE}
        cy={SKY_CENTRE}
        r={skyRadius(maskDeg)}
        fill="none"
        stroke="var(--ink)"
        strokeWidth="1.25"
        strokeDasharray="2 3"
      />
      <text x={SKY_CENTRE + 3} y={SKY_CENTRE + skyRadius(maskDeg) - 4} className="plot-note">
        {maskDeg}°
      </text>
    </SkyDial>
  );
}
