"use client";
import { useMemo, type KeyboardEvent, type PointerEvent } from "react";
import { curvePath } from "@/components/plots/curvePath";
import { PlotStage } from "@/components/plots/PlotStage";
import { useLineCursor } from "@/components/plots/useLineCursor";
import { useWidth } from "@/components/plots/useWidth";
import { formatNumber } from "@/components/ui/formatNumber";
import { utcOf } from "@/lib/gnss/sky/receiverLog";
import { timeAxis, timesS, type LogTimes } from "./logAxis";
import type { LogCursor } from "./LogSeries";

export type Satellite = { prn: number; cn0DbHz: Float64Array };

type SatelliteStripsProps = {
  log: LogTimes;
  satellites: readonly Satellite[];
  chosen: number;
  onChoose: (prn: number) => void;
  cursor: LogCursor;
};

const ROW = 30;
const NAME = 44;
const FOOT = 24;
const LOWEST_DBHZ = 20;
const HIGHEST_DBHZ = 56;

/** C/N0 of every satellite against time, a strip each, so that what falls together is seen together. */
export function SatelliteStrips({ log, satellites, chosen, onChoose, cursor }: SatelliteStripsProps) {
  const [box, width] = useWidth<HTMLDivElement>(640);
  const x = useMemo(() => timesS(log), [log]);
  const axis = timeAxis(log);
  const right = width - 4;
  const toPx = (seconds: number) => NAME + ((seconds - axis.from) / (axis.to - axis.from)) * (right - NAME);
  const row = Math.max(
    0,
    satellites.findIndex(({ prn }) => prn === chosen),
  );
  const line = useLineCursor(
    { index: cursor.reading, onMove: cursor.onMove, onTake: cursor.onTake },
    { x, y: satellites[row].cn0DbHz, toPx },
  );
  const height = satellites.length * ROW + FOOT;
  const choose = (to: number) => onChoose(satellites[Math.min(Math.max(0, to), satellites.length - 1)].prn);
  const keyed = (event: KeyboardEvent) => {
    if (event.key !== "ArrowUp" && event.key !== "ArrowDown") return line.onKey(event);
    choose(row + (event.key === "ArrowDown" ? 1 : -1));
    return true;
  };
  const pointed = (event: PointerEvent<HTMLDivElement>) => {
    if (event.type === "pointerdown")
      choose(Math.floor((event.clientY - event.currentTarget.getBoundingClientRect().top) / ROW));
    line.onPointer(event);
  };
  const at = toPx(x[line.index]);
  return (
    <PlotStage
      box={box}
      summary={`C/N0 of ${satellites.length} satellites from ${utcOf(log, 0)} to ${utcOf(log, log.readings - 1)} UTC, one strip each.`}
      reading={`${utcOf(log, line.index)} UTC, PRN ${chosen}, ${cn0Text(satellites[row].cn0DbHz[line.index])}`}
      cursor="line"
      onCursorKey={keyed}
      onPointer={pointed}
      onNudge={(across, up) => (up ? choose(row - up) : line.nudge(across))}
      hints={[
        { keys: ["←", "→"], word: "one reading" },
        { keys: ["↑", "↓"], word: "satellite" },
        { keys: ["T"], word: "table" },
      ]}
      table={{
        columns: [
          { name: `s after ${utcOf(log, 0)}`, values: x.map((seconds) => seconds - x[0]), decimals: 0 },
          ...satellites.map(({ prn, cn0DbHz }) => ({ name: `PRN ${prn}`, values: cn0DbHz, decimals: 0 })),
        ],
        start: line.index,
      }}
    >
      <svg width={width} height={height} className="plot-svg" aria-hidden>
        {satellites.map(({ prn, cn0DbHz }, n) => {
          const level = (dbHz: number) =>
            (n + 1) * ROW - 4 - ((dbHz - LOWEST_DBHZ) / (HIGHEST_DBHZ - LOWEST_DBHZ)) * (ROW - 6);
          const own = prn === chosen;
          return (
            <g key={prn}>
              {own && <rect x={0} y={n * ROW} width={right} height={ROW} fill="var(--plus)" opacity="var(--band-o)" />}
              <path d={`M${NAME} ${(n + 1) * ROW}H${right}`} className="plot-grid" />
              <text x={0} y={(n + 1) * ROW - 10} className="plot-tick" fontWeight={own ? 700 : 500}>
                {`PRN ${prn}`}
              </text>
              <path
                d={curvePath({ x, y: cn0DbHz }, { x: toPx, y: level, left: NAME, right })}
                className="plot-curve"
                stroke="var(--plus)"
                strokeWidth={own ? 2.5 : 1.5}
              />
            </g>
          );
        })}
        {axis.ticks!.map((tick) => (
          <text key={tick} x={toPx(tick)} y={height - 7} className="plot-tick" textAnchor="middle">
            {axis.text!(tick)}
          </text>
        ))}
        <path d={`M${at} 0V${satellites.length * ROW}`} className="plot-cursor" />
      </svg>
    </PlotStage>
  );
}

const cn0Text = (dbHz: number) => (Number.isFinite(dbHz) ? `${formatNumber(dbHz)} dB-Hz` : "not tracked");
