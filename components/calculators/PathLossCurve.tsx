"use client";
import { useMemo, useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { L1_HZ } from "@/lib/gnss/constants";
import { pathLossDb } from "@/lib/gnss/interference/standOff";
import { log10, pow10 } from "@/lib/numeric/elementary";

type PathLossCurveProps = { exponent: number; screenDb: number; startM: number };

const DECADES = 5; // 1 m to 100 km
const PER_DECADE = 100; // neighbours are 2.3 % apart

/** Loss of a path at GPS L1 against distance; the cursor reads both. */
export function PathLossCurve({ exponent, screenDb, startM }: PathLossCurveProps) {
  const curve = useMemo(() => {
    const x = Float64Array.from({ length: DECADES * PER_DECADE + 1 }, (_, n) => n / PER_DECADE);
    const path = { eirpDbm: 0, antennaGainDb: 0, frequencyHz: L1_HZ, exponent, screenDb };
    return { x, y: x.map((decades) => pathLossDb(path, pow10(decades))) };
  }, [exponent, screenDb]);
  const [index, setIndex] = useState(() => Math.round(log10(startM) * PER_DECADE));
  const lines = (at: number) => [distanceText(pow10(curve.x[at]!)), `${formatNumber(curve.y[at]!, 1)} dB`];
  const top = Math.ceil(curve.y[curve.y.length - 1]! / 20) * 20;
  return (
    <LinePlot
      x={{ name: "distance", from: 0, to: DECADES, ticks: [0, 1, 2, 3, 4, 5], text: (n) => distanceText(pow10(n)) }}
      y={{ name: "path loss, dB", from: 20, to: top, decimals: 1 }}
      curves={[{ name: "path loss", role: "subject", ...curve }]}
      columns={[
        { name: "distance, m", values: curve.x.map(pow10), decimals: 1 },
        { name: "path loss, dB", values: curve.y, decimals: 1 },
      ]}
      summary={`Path loss against distance at exponent ${formatNumber(exponent, 1)} behind ${formatNumber(screenDb)} dB, from ${formatNumber(curve.y[0]!, 1)} dB at 1 m.`}
      cursor={{ index, onMove: setIndex, lines }}
      height={260}
    />
  );
}

/** Three figures, in km from 1 km. */
function distanceText(m: number): string {
  const [value, unit] = m < 999.5 ? [m, "m"] : [m / 1000, "km"];
  return `${Number(value.toPrecision(3))} ${unit}`;
}
