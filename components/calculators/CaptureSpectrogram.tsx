"use client";
import { useMemo, useState, type ReactNode } from "react";
import { CellPlot } from "@/components/plots/CellPlot";
import { rowCut } from "@/components/plots/gridCuts";
import type { HeatRamp } from "@/components/plots/heat";
import type { Cell } from "@/components/plots/useGridCursor";
import { formatNumber } from "@/components/ui/formatNumber";
import { Notice } from "@/components/ui/Notice";
import { Working } from "@/components/ui/Working";
import { refusalSentence } from "./refusalSentence";
import type { ShownSpectrogram } from "./shownSpectrogram";

const RAMP: HeatRamp = { steps: "level", topDb: 30, from: "median" };

type CaptureSpectrogramProps = {
  shown: ShownSpectrogram | null;
  refused: string | null;
  fields: ReactNode;
  /** In a case the highest cell is for the person to find, so the crosshair begins in the middle. */
  fromMiddle?: boolean;
};

/** What comes and goes in a recording: its spectrum row by row, time upwards. */
export function CaptureSpectrogram({ shown, refused, fields, fromMiddle }: CaptureSpectrogramProps) {
  return (
    <section className="grid gap-3">
      <h3 className="text-h3">Spectrogram</h3>
      <div className="grid max-w-measure grid-cols-1 gap-3 tablet:grid-cols-2 no-print">{fields}</div>
      {refused && (
        <Notice tone="caution" fact="This stretch cannot be drawn." live>
          {refusalSentence(refused)}
        </Notice>
      )}
      {shown ? (
        <TimeAndFrequency shown={shown} fromMiddle={fromMiddle} />
      ) : (
        !refused && <Working label="Drawing the spectrogram" />
      )}
    </section>
  );
}

function TimeAndFrequency({ shown, fromMiddle }: { shown: ShownSpectrogram; fromMiddle?: boolean }) {
  const { fromL1MHz, timesMs, power, overview, resolutionKHz, rowMs, averaged } = shown;
  const [moved, setMoved] = useState<{ of: ShownSpectrogram; cell: Cell } | null>(null);
  const columns = fromL1MHz.length;
  const top = overview.peaks[0];
  const start = fromMiddle
    ? { row: timesMs.length >> 1, column: columns >> 1 }
    : { row: Math.floor(top / columns), column: top % columns };
  const cell = moved?.of === shown ? moved.cell : start;
  const across = useMemo(() => ({ name: "from L1, MHz", values: fromL1MHz, signed: true }), [fromL1MHz]);
  const up = useMemo(() => ({ name: "time, ms", values: timesMs }), [timesMs]);
  const timeDecimals = rowMs < 0.1 ? 3 : rowMs < 10 ? 1 : 0;
  const db = ({ row, column }: Cell) => 10 * Math.log10(Math.max(1e-30, power[row * columns + column]));
  const lines = (at: Cell) => [
    `${formatNumber(fromL1MHz[at.column], 3, true)} MHz`,
    `${formatNumber(timesMs[at.row], timeDecimals)} ms`,
    `${formatNumber(db(at), 1, true)} dB`,
  ];
  const resolution = `${formatNumber(resolutionKHz, 2)} kHz and ${formatNumber(rowMs, rowMs < 1 ? 3 : 1)} ms`;
  return (
    <div>
      <CellPlot
        across={across}
        up={up}
        overview={overview}
        ramp={RAMP}
        cell={cell}
        onMove={(next) => setMoved({ of: shown, cell: next })}
        summary={`Spectrogram of the recording, resolution ${resolution}: highest ${formatNumber(db({ row: Math.floor(top / columns), column: top % columns }), 1)} dB over the median.`}
        reading={(at) => lines(at).join(", ")}
        lines={lines}
        columns={({ row }) => [
          {
            name: `from L1 at ${formatNumber(timesMs[row], timeDecimals)} ms, MHz`,
            values: fromL1MHz,
            decimals: 3,
            signed: true,
          },
          {
            name: "density over the median, dB",
            values: decibels(rowCut(power, columns, row)),
            decimals: 1,
            signed: true,
          },
        ]}
        height={340}
      />
      <p className="mt-1 text-label font-normal text-ink-2 figures">
        Resolution {resolution}; {averaged === 1 ? "one transform" : `${formatNumber(averaged)} transforms averaged`} a
        row.
      </p>
    </div>
  );
}

const decibels = (powers: Float32Array) => powers.map((power) => 10 * Math.log10(Math.max(1e-30, power)));
