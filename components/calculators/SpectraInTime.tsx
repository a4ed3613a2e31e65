"use client";
import { useState } from "react";
import { CellPlot } from "@/components/plots/CellPlot";
import type { Cell } from "@/components/plots/useGridCursor";
import { formatNumber } from "@/components/ui/formatNumber";
import { decibels } from "@/lib/numeric/elementary";
import type { Look } from "./lookAt";

const RAMP = { steps: "level", topDb: 35, from: "median" } as const;

/** Spectra one after the other: frequency across, time up, level as the ramp. */
export function SpectraInTime({ inTime }: { inTime: Look["inTime"] }) {
  const { offsetsHz, timesS, resolutionHz, power, overview } = inTime;
  const [cell, setCell] = useState<Cell>({ row: timesS.length >> 1, column: offsetsHz.length >> 1 });
  const khz = offsetsHz.map((hz) => hz / 1000);
  const us = timesS.map((s) => s * 1e6);
  const at = { row: Math.min(cell.row, us.length - 1), column: Math.min(cell.column, khz.length - 1) };
  const levelDb = (row: number, column: number) => decibels(Math.max(1e-9, power[row * khz.length + column]!));
  const lines = ({ row, column }: Cell) => [
    `${formatNumber(khz[column]!, 0, true)} kHz`,
    `${formatNumber(us[row]!, 1)} µs`,
    `${formatNumber(levelDb(row, column), 1, true)} dB`,
  ];
  return (
    <CellPlot
      across={{ name: "from the centre, kHz", values: khz, signed: true }}
      up={{ name: "time, µs", values: us }}
      overview={overview}
      ramp={RAMP}
      summary={`Spectra in time, ${formatNumber(us[us.length - 1]!)} µs from the start of the capture.`}
      reading={(one) => lines(one).join(", ")}
      lines={lines}
      columns={({ row }) => [
        { name: `from the centre at ${formatNumber(us[row]!, 1)} µs, kHz`, values: khz, decimals: 0, signed: true },
        {
          name: "over the median, dB",
          values: khz.map((_, column) => levelDb(row, column)),
          decimals: 1,
          signed: true,
        },
      ]}
      cell={at}
      onMove={setCell}
      height={320}
      note={
        <span className="text-label font-normal text-ink-2 figures">
          Resolution {formatNumber(resolutionHz / 1000, 0)} kHz and {formatNumber((us[1]! - us[0]!) * 2, 1)} µs
        </span>
      }
    />
  );
}
