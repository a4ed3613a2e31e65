"use client";
import { useId } from "react";
import { plotGeometry, type Axis, type PlotGeometry } from "@/components/plots/geometry";
import { GridCursorShape } from "@/components/plots/GridCursorShape";
import { PlotFrame } from "@/components/plots/PlotFrame";
import { PlotStage } from "@/components/plots/PlotStage";
import { useGridCursor } from "@/components/plots/useGridCursor";
import { useWidth } from "@/components/plots/useWidth";
import { formatNumber } from "@/components/ui/formatNumber";
import type { BearingLine, Ellipse, Place } from "@/lib/gnss/interference/bearingFix";
import { cosTurns, sinTurns } from "@/lib/numeric/elementary";

export type PatrolStop = Place & { stop: number; line: BearingLine | null };

type BearingMapProps = {
  stops: readonly PatrolStop[];
  /** Stops whose bearing is left out: drawn dashed. */
  leftOut: ReadonlySet<number>;
  ellipse: Ellipse | null;
  place: Place;
  onMove: (place: Place) => void;
  onTake?: () => void;
  /** Width in m of a close view around the cursor; left out, everything is shown. */
  closeM?: number;
  summary: string;
};

const STEP_M = 5;
const NO_PEAKS: readonly number[] = []; // a map has none to go to
const HINTS = [
  { keys: ["←", "→", "↑", "↓"], word: "5 m" },
  { keys: ["Shift"], word: "50 m" },
  { keys: ["T"], word: "table" },
];

/** Stops and their bearings on the grid, with a cursor for the place and an ellipse about it. */
export function BearingMap({ stops, leftOut, ellipse, place, onMove, onTake, closeM, summary }: BearingMapProps) {
  const [box, width] = useWidth<HTMLDivElement>(560);
  const clipId = useId();
  const height = Math.min(width, 560);
  const whole = boundsOf(stops);
  const g = evenGeometry(width, height, closeM ? boundsAround(place, closeM) : whole);
  const rows = Math.ceil((whole.northTo - whole.northFrom) / STEP_M) + 1;
  const columns = Math.ceil((whole.eastTo - whole.eastFrom) / STEP_M) + 1;
  const cellOf = ({ eastM, northM }: Place) => ({
    row: Math.round((northM - whole.northFrom) / STEP_M),
    column: Math.round((eastM - whole.eastFrom) / STEP_M),
  });
  const cursor = useGridCursor(
    {
      cell: cellOf(place),
      onMove: ({ row, column }) =>
        onMove({ eastM: whole.eastFrom + column * STEP_M, northM: whole.northFrom + row * STEP_M }),
      onTake,
    },
    { peaks: NO_PEAKS, rows, columns, cellAt: (px, py) => cellOf({ eastM: g.xAt(px), northM: g.yAt(py) }) },
  );
  return (
    <PlotStage
      box={box}
      summary={summary}
      reading={`east ${formatNumber(place.eastM)} m, north ${formatNumber(place.northM)} m`}
      cursor="both"
      onCursorKey={cursor.onKey}
      onPointer={cursor.onPointer}
      onNudge={cursor.nudge}
      table={{ columns: tableColumns(stops) }}
      hints={HINTS}
    >
      <PlotFrame
        geometry={g}
        x={EAST}
        y={NORTH}
        clipId={clipId}
        over={<GridCursorShape g={g} x={g.x(place.eastM)} y={g.y(place.northM)} />}
      >
        {ellipse && <EllipseShape g={g} ellipse={ellipse} />}
        {stops.map((stop) => (
          <StopShape key={stop.stop} g={g} stop={stop} isOut={leftOut.has(stop.stop)} />
        ))}
      </PlotFrame>
    </PlotStage>
  );
}

// Names alone: what is shown from where to where is the geometry's.
const EAST: Axis = { name: "east, m", from: 0, to: 1 };
const NORTH: Axis = { name: "north, m", from: 0, to: 1 };

type Bounds = { eastFrom: number; eastTo: number; northFrom: number; northTo: number };
const EDGE_M = 150;
const BEYOND_M = 500; // of the stops: the transmitter may stand outside of all of them

/** Whole hundreds of metres about the stops, so that the cells of the cursor are whole fives. */
function boundsOf(stops: readonly Place[]): Bounds {
  const [east, north] = [stops.map(({ eastM }) => eastM), stops.map(({ northM }) => northM)];
  const down = (values: number[]) => Math.floor((Math.min(...values) - EDGE_M) / 100) * 100;
  const up = (values: number[]) => Math.ceil((Math.max(...values) + EDGE_M) / 100) * 100;
  const wide = (from: number, to: number) => (to - from < 2 * BEYOND_M ? [from - BEYOND_M, to + BEYOND_M] : [from, to]);
  const [eastFrom, eastTo] = wide(down(east), up(east));
  const [northFrom, northTo] = wide(down(north), up(north));
  return { eastFrom, eastTo, northFrom, northTo };
}

const boundsAround = ({ eastM, northM }: Place, widthM: number): Bounds => ({
  eastFrom: eastM - widthM / 2,
  eastTo: eastM + widthM / 2,
  northFrom: northM - widthM / 2,
  northTo: northM + widthM / 2,
});

/** A metre is as long across as it is up: the tighter axis decides, the other shows more. */
function evenGeometry(width: number, height: number, bounds: Bounds): PlotGeometry {
  const x: Axis = { name: "", from: bounds.eastFrom, to: bounds.eastTo };
  const y: Axis = { name: "", from: bounds.northFrom, to: bounds.northTo };
  const first = plotGeometry(width, height, x, y);
  const across = (first.right - first.left) / (x.to - x.from);
  const up = (first.bottom - first.top) / (y.to - y.from);
  const more = (from: number, to: number, share: number) => {
    const add = ((to - from) * (share - 1)) / 2;
    return { name: "", from: from - add, to: to + add };
  };
  return across > up
    ? plotGeometry(width, height, more(x.from, x.to, across / up), y)
    : plotGeometry(width, height, x, more(y.from, y.to, up / across));
}

const FAR_M = 10_000; // beyond every map

function StopShape({
  g,
  stop: { stop, eastM, northM, line },
  isOut,
}: {
  g: PlotGeometry;
  stop: PatrolStop;
  isOut: boolean;
}) {
  const [x, y] = [g.x(eastM), g.y(northM)];
  const turns = (line?.bearingDeg ?? 0) / 360;
  return (
    <g>
      {line && (
        <path
          data-bearing={stop}
          d={`M${x} ${y}L${g.x(eastM + FAR_M * sinTurns(turns))} ${g.y(northM + FAR_M * cosTurns(turns))}`}
          className="plot-curve"
          stroke={isOut ? "var(--ink-3)" : "var(--plus)"}
          strokeWidth={isOut ? 1.25 : 1.75}
          strokeDasharray={isOut ? "5 4" : undefined}
        />
      )}
      <rect
        x={x - 4.5}
        y={y - 4.5}
        width="9"
        height="9"
        fill={line ? "var(--ink)" : "var(--sheet)"}
        stroke="var(--ink)"
        strokeWidth="1.5"
      />
      <text x={x + 9} y={y - 6} className="plot-curve-name" fill="var(--ink)">
        {stop}
      </text>
    </g>
  );
}

function EllipseShape({
  g,
  ellipse: { eastM, northM, semiMajorM, semiMinorM, azimuthDeg },
}: {
  g: PlotGeometry;
  ellipse: Ellipse;
}) {
  const [cx, cy] = [g.x(eastM), g.y(northM)];
  const scale = g.x(1) - g.x(0);
  return (
    <ellipse
      data-ellipse
      cx={cx}
      cy={cy}
      rx={semiMinorM * scale}
      ry={semiMajorM * scale}
      transform={`rotate(${azimuthDeg} ${cx} ${cy})`}
      fill="var(--ink)"
      fillOpacity="var(--band-o)"
      stroke="var(--ink)"
      strokeWidth="2"
    />
  );
}

const tableColumns = (stops: readonly PatrolStop[]) => [
  { name: "stop", values: stops.map(({ stop }) => stop), decimals: 0 },
  { name: "east, m", values: stops.map(({ eastM }) => eastM), decimals: 0 },
  { name: "north, m", values: stops.map(({ northM }) => northM), decimals: 0 },
];
