"use client";
import { useMemo } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import { CellPlot, type CellPlotProps } from "./CellPlot";
import { rowCut } from "./gridCuts";
import type { HeatRamp } from "./heat";

export type GridPlotProps = Pick<
  CellPlotProps,
  "cell" | "onMove" | "onTake" | "overview" | "summary" | "lines" | "height" | "margins"
> & {
  dopplersHz: Float64Array;
  lagsChips: Float64Array;
  /** Row after row, one row a Doppler; noise is 1. */
  power: Float32Array;
};

const RAMP: HeatRamp = { steps: "amplitude", topDb: 10, from: "noise" };

/** Search grid: Doppler up, code phase across. */
export function GridPlot({ dopplersHz, lagsChips, power, ...rest }: GridPlotProps) {
  const across = useMemo(() => ({ name: "code phase, chip", values: lagsChips }), [lagsChips]);
  const up = useMemo(
    () => ({ name: "Doppler, Hz", values: dopplersHz, signed: true, ticks: quarters(dopplersHz) }),
    [dopplersHz],
  );
  const columns = lagsChips.length;
  const hz = (row: number) => `${formatNumber(dopplersHz[row], 0, true)} Hz`;
  return (
    <CellPlot
      {...rest}
      across={across}
      up={up}
      ramp={RAMP}
      reading={({ row, column }) =>
        `${formatNumber(lagsChips[column], 2)} chip, ${hz(row)}, power ${formatNumber(power[row * columns + column], 2)}, noise 1`
      }
      columns={({ row }) => [
        { name: `code phase at ${hz(row)}, chip`, values: lagsChips, decimals: 2 },
        { name: "power, noise = 1", values: rowCut(power, columns, row), decimals: 2 },
      ]}
    />
  );
}

/** Ends, middle and what lies half way: the Doppler values a search is spoken of by. */
const quarters = (dopplersHz: Float64Array) => {
  const [from, to] = [dopplersHz[0], dopplersHz[dopplersHz.length - 1]];
  return [0, 0.25, 0.5, 0.75, 1].map((part) => Math.round(from + part * (to - from)));
};
