"use client";
import { useMemo, useState } from "react";
import type { Reading } from "@/components/calculators/reading";
import { FigureField } from "@/components/calculators/FigureField";
import { StandingCalculator } from "@/components/calculators/StandingCalculator";
import { Key } from "@/components/ui/Key";
import { SectionHead } from "@/components/ui/SectionHead";
import { formatNumber } from "@/components/ui/formatNumber";
import { TimeErrorPlots } from "./TimeErrorPlots";

export type PulseAcceptanceData = { readingsNs: number[]; intervalS: number; limitNs: number; clock: string };

/** As large as a difference of two leads may be; a first guess of nothing, so that the person has to think of it. */
const LEADS = { from: -1000, to: 1000, decimals: 1, signed: true } as const;

/** The log with the limit beside it, less what the person takes off and leaves out, and the bench's own figures. */
export function PulseAcceptanceWork({
  data: { readingsNs, intervalS, limitNs, clock },
  onTake,
}: {
  data: PulseAcceptanceData;
  onTake?: (reading: Reading) => void;
}) {
  const [leadsNs, setLeadsNs] = useState(0);
  const [index, setIndex] = useState(0);
  const [leftOut, setLeftOut] = useState<readonly number[]>([]);
  const valuesNs = useMemo(
    () => Float64Array.from(readingsNs, (reading, n) => (leftOut.includes(n) ? NaN : reading - leadsNs)),
    [readingsNs, leadsNs, leftOut],
  );
  const isOut = leftOut.includes(index);
  const turn = () => setLeftOut(isOut ? leftOut.filter((n) => n !== index) : [...leftOut, index]);
  const take = () => {
    if (!isOut) onTake?.({ timeS: index * intervalS, levelNs: valuesNs[index] });
  };
  const at = `${formatNumber((index * intervalS) / 60, 1)} min`;
  return (
    <div className="grid gap-8">
      <section>
        <SectionHead title="Log" note={`${clock}: ±${formatNumber(limitNs)} ns`} />
        <div className="mt-4 grid gap-5">
          <FigureField
            label="Taken off each reading"
            unit="ns"
            bounds={LEADS}
            value={leadsNs}
            onChange={(value) => setLeadsNs(value ?? 0)}
          />
          <TimeErrorPlots {...{ valuesNs, intervalS, limitNs, index }} onMove={setIndex} onTake={onTake && take} />
          <div className="flex flex-wrap items-center gap-3">
            <Key onClick={turn}>{isOut ? `Put the reading at ${at} back` : `Leave the reading at ${at} out`}</Key>
            {onTake && (
              <Key variant="filled" onClick={take} reason={isOut ? "This reading is left out." : null}>
                {`Take ${at}`}
              </Key>
            )}
            <span className="text-dense text-ink-2 figures" role="status">
              {leftOut.length === 1 ? "1 reading left out" : `${formatNumber(leftOut.length)} readings left out`}
            </span>
          </div>
        </div>
      </section>
      <section>
        <SectionHead title="Pulse error" note="the bench's own; paste the log or drop its file" />
        <div className="mt-4">
          <StandingCalculator tag="PulseError" attributes={{ source: "log", clock }} />
        </div>
      </section>
    </div>
  );
}
