"use client";
import { useMemo } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { delayedCorrelation } from "./delayedCode";

const STEP_CHIPS = 0.25;
const REACH_CHIPS = 10;

/** The surroundings of a peak, read with a cursor: agreement falls straight from chip to chip. */
export function PeakReading({ prn, delayChips }: { prn: number; delayChips: number }) {
  const { lags, agreement } = useMemo(() => around(delayedCorrelation(prn, delayChips), delayChips), [prn, delayChips]);
  return (
    <LinePlot
      x={{ name: "lag, chip", from: delayChips - REACH_CHIPS, to: delayChips + REACH_CHIPS }}
      y={{ name: "agreement, chips of 1\u2009023", from: -100, to: 1100, ticks: [0, 500, 1000] }}
      curves={[{ name: "agreement", role: "subject", x: lags, y: agreement }]}
      cursor={{
        lines: (at) => [`lag ${formatNumber(lags[at], 2)} chip`, `agreement ${formatNumber(agreement[at], 0)}`],
      }}
      summary={`Agreement of satellite ${prn}'s code with its own copy around lag ${delayChips} chip.`}
      height={210}
    />
  );
}

/** Between two whole lags the agreement of square chips runs straight. */
function around(values: Int32Array, centre: number) {
  const count = (2 * REACH_CHIPS) / STEP_CHIPS + 1;
  const lags = Float64Array.from({ length: count }, (_, at) => centre - REACH_CHIPS + at * STEP_CHIPS);
  const agreement = lags.map((lag) => {
    const below = Math.floor(lag);
    const low = values[below % values.length];
    return low + (lag - below) * (values[(below + 1) % values.length] - low);
  });
  return { lags, agreement };
}
