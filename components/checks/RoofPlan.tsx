import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";

type Place = { eastM: number; northM: number };
export type RoofData = {
  hatch: Place;
  emitters: (Place & { name: string; keepOutM: number })[];
  positions: (Place & { id: string })[];
};

const SCALE = 10; // drawing units a metre
const MARGIN_M = 2;
const ROOF_M = { east: 30, north: 20 };
const WIDTH = (ROOF_M.east + 2 * MARGIN_M) * SCALE;
const HEIGHT = (ROOF_M.north + 2 * MARGIN_M) * SCALE;

const across = ({ eastM }: Place) => (eastM + MARGIN_M) * SCALE;
const down = ({ northM }: Place) => HEIGHT - (northM + MARGIN_M) * SCALE;
const metres = (value: number) => value.toFixed(1);

/** The plan of a roof: positions, hatch, and what radiates with its keep-out distance, drawn and as a table. */
export function RoofPlan({ data: { hatch, emitters, positions } }: { data: RoofData }) {
  const rows = [
    ...positions.map((one) => ({ ...one, name: `Position ${one.id}`, keepOutM: null })),
    ...emitters.map((one, n) => ({ ...one, name: `${n + 1} ${one.name}` })),
    { ...hatch, name: "Hatch", keepOutM: null },
  ];
  return (
    <section>
      <SectionHead title="Roof plan" note="north up, a square is 5 m; keep-out distances dotted" level={3} />
      <Drawing hatch={hatch} emitters={emitters} positions={positions} />
      <Table caption="Places on the roof, in m from its south-west corner" showCaption className="mt-3">
        <thead>
          <tr>
            <Th>Place</Th>
            <Th figure>East, m</Th>
            <Th figure>North, m</Th>
            <Th figure>Keep out, m</Th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ name, eastM, northM, keepOutM }) => (
            <Tr key={name}>
              <RowHead>{name}</RowHead>
              <Td figure>{metres(eastM)}</Td>
              <Td figure>{metres(northM)}</Td>
              <Td figure>{keepOutM === null ? "–" : metres(keepOutM)}</Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}

function Drawing({ hatch, emitters, positions }: RoofData) {
  const summary = `Plan of a roof with ${positions.length} positions, ${emitters.length} emitters with their keep-out distances, and the hatch. All places stand in the table below.`;
  const lines = [0, 5, 10, 15, 20, 25, 30].flatMap((m) => [
    `M${across({ eastM: m, northM: 0 })} ${down({ eastM: 0, northM: 0 })}V${down({ eastM: 0, northM: ROOF_M.north })}`,
    ...(m <= ROOF_M.north
      ? [
          `M${across({ eastM: 0, northM: m })} ${down({ eastM: 0, northM: m })}H${across({ eastM: ROOF_M.east, northM: 0 })}`,
        ]
      : []),
  ]);
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      className="mt-2 block h-auto w-full max-w-[560px]"
      role="img"
      aria-label={summary}
    >
      <path d={lines.join("")} className="plot-grid" />
      {emitters.map((one, n) => (
        <g key={one.name}>
          <circle
            cx={across(one)}
            cy={down(one)}
            r={one.keepOutM * SCALE}
            fill="none"
            className="plot-limit"
            stroke="var(--minus-deep)"
          />
          <path d={`M${across(one) - 4} ${down(one) - 4}l8 8m0 -8l-8 8`} stroke="var(--minus-deep)" strokeWidth="2" />
          <Name at={one}>{n + 1}</Name>
        </g>
      ))}
      <rect
        x={across(hatch) - 5}
        y={down(hatch) - 5}
        width="10"
        height="10"
        fill="var(--sheet)"
        stroke="var(--ink)"
        strokeWidth="1.25"
      />
      <Name at={hatch}>hatch</Name>
      {positions.map((one) => (
        <g key={one.id}>
          <rect x={across(one) - 4} y={down(one) - 4} width="8" height="8" fill="var(--plus)" />
          <Name at={one} before>
            {one.id}
          </Name>
        </g>
      ))}
    </svg>
  );
}

/** Beside a place, on the other side where the edge of the roof is near: positions at the left, so that emitters do not meet them. */
function Name({ at, before = false, children }: { at: Place; before?: boolean; children: React.ReactNode }) {
  const left = before ? at.eastM >= 2 : at.eastM > ROOF_M.east - 4;
  return (
    <text x={across(at) + (left ? -9 : 9)} y={down(at) + 4.5} textAnchor={left ? "end" : "start"} className="plot-note">
      {children}
    </text>
  );
}
