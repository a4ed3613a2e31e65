"use client";
import { useMemo, useState } from "react";
import { AxisSlider } from "@/components/plots/AxisSlider";
import { LinePlot } from "@/components/plots/LinePlot";
import { ScatterPlot } from "@/components/plots/ScatterPlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { TwoWay } from "@/components/ui/TwoWay";

/** What the case gives beside its words. */
export type PromptData = { channels: readonly { prn: number; i: readonly number[]; q: readonly number[] }[] };

const WINDOW_MS = 200; // ten data bits
const STEP_MS = 10;
const NAMES_AT = 0.86; // of the height, above most of the noise

/** The prompts of one channel: I and Q against time, and one against the other. Nothing is estimated here. */
export function PromptView({ data: { channels } }: { data: PromptData }) {
  const [chosen, setChosen] = useState(0);
  const [fromMs, setFromMs] = useState(0);
  const { prn, i, q } = channels[chosen]!;
  const shown = useMemo(() => {
    const times = Float64Array.from({ length: WINDOW_MS }, (_, n) => fromMs + n);
    return { times, i: i.slice(fromMs, fromMs + WINDOW_MS), q: q.slice(fromMs, fromMs + WINDOW_MS) };
  }, [i, q, fromMs]);
  const reach = useMemo(() => 1.05 * Math.max(...i.map(Math.abs), ...q.map(Math.abs)), [i, q]);
  const axis = (name: string) => ({ name, from: -reach, to: reach, signed: true });
  const span = `${formatNumber(fromMs)} to ${formatNumber(fromMs + WINDOW_MS)} ms`;
  const columns = [
    { name: "time, ms", values: shown.times, decimals: 0 },
    { name: "I, counts", values: shown.i, decimals: 0, signed: true },
    { name: "Q, counts", values: shown.q, decimals: 0, signed: true },
  ];
  return (
    <div className="grid gap-5">
      <TwoWay
        name="channel"
        label="Channel"
        showLabel
        choices={channels.map((_, n) => ({ value: String(n), label: String(n + 1) }))}
        value={String(chosen)}
        onChange={(value) => setChosen(Number(value))}
      />
      <section>
        <h3 className="text-h3">{`I and Q of channel ${chosen + 1}, PRN ${prn}`}</h3>
        <LinePlot
          x={{ name: "time, ms", from: fromMs, to: fromMs + WINDOW_MS }}
          y={axis("prompt, counts")}
          curves={[
            { name: "I", role: "subject", x: shown.times, y: shown.i, nameAt: { x: fromMs + 4, y: NAMES_AT * reach } },
            {
              name: "Q",
              role: "comparison",
              tone: "minus",
              x: shown.times,
              y: shown.q,
              nameAt: { x: fromMs + 14, y: NAMES_AT * reach },
            },
          ]}
          columns={columns}
          summary={`I in blue and Q in red of PRN ${prn}, one prompt a millisecond, from ${span}.`}
          cursor={{
            lines: (at) => [
              `${formatNumber(fromMs + at)} ms`,
              `I ${formatNumber(shown.i[at]!, 0, true)}`,
              `Q ${formatNumber(shown.q[at]!, 0, true)}`,
            ],
          }}
          height={260}
        />
        <AxisSlider
          label="Shown from"
          unit="ms"
          from={0}
          to={i.length - WINDOW_MS}
          step={STEP_MS}
          value={fromMs}
          onChange={setFromMs}
        />
      </section>
      <section>
        <h3 className="text-h3">Q against I</h3>
        <ScatterPlot
          x={axis("I, counts")}
          y={axis("Q, counts")}
          points={{ x: shown.i, y: shown.q }}
          columns={columns}
          summary={`Q against I of PRN ${prn}, ${WINDOW_MS} prompts from ${span}.`}
        />
      </section>
    </div>
  );
}
