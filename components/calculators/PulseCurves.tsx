"use client";
import { useMemo, useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import type { MaskedPoint } from "@/lib/gnss/timing/pulseReport";
import type { FoundPulse } from "./PulseLog";

/** Time error with its limits, MTIE and TDEV with their masks. */
export function PulseCurves({ found, clock }: { found: FoundPulse; clock: string }) {
  const { report } = found;
  return (
    <>
      <TimeErrorPlot key={found.run} found={found} />
      <div className="grid gap-x-8 gap-y-5 @2xl:grid-cols-2">
        <MaskPlot name="MTIE" clock={clock} points={report.mtie} />
        <MaskPlot name="TDEV" clock={clock} points={report.tdev} />
      </div>
    </>
  );
}

function TimeErrorPlot({ found: { report, valuesNs, intervalS } }: { found: FoundPulse }) {
  const { summary, maxLimitNs } = report;
  const [index, setIndex] = useState(summary.at);
  const x = useMemo(() => Float64Array.from(valuesNs, (_, at) => (at * intervalS) / 3600), [valuesNs, intervalS]);
  const reach = 1.15 * Math.max(maxLimitNs, summary.maxAbsNs);
  return (
    <LinePlot
      x={{ name: "time, h", from: 0, to: x[x.length - 1] }}
      y={{ name: "time error, ns", from: -reach, to: reach, signed: true }}
      curves={[{ name: "time error", role: "comparison", x, y: valuesNs }]}
      bands={[{ y: [-maxLimitNs, maxLimitNs] }]}
      limits={[
        { y: maxLimitNs, name: `+${formatNumber(maxLimitNs)} ns`, tone: "minus" },
        { y: -maxLimitNs, name: `\u2212${formatNumber(maxLimitNs)} ns`, tone: "minus" },
      ]}
      summary={`Time error over ${formatNumber(x[x.length - 1], 1)} h: largest ${formatNumber(summary.maxAbsNs, 1)} ns, mean ${formatNumber(summary.meanNs, 1, true)} ns.`}
      cursor={{
        index,
        onMove: setIndex,
        lines: (at) => [
          `${formatNumber(x[at], 3)} h`,
          Number.isNaN(valuesNs[at]) ? "no reading" : `${formatNumber(valuesNs[at], 1, true)} ns`,
        ],
      }}
      columns={[
        { name: "time, s", values: x.map((hours) => hours * 3600), decimals: intervalS < 1 ? 2 : 0 },
        { name: "time error, ns", values: valuesNs, decimals: 2, signed: true },
      ]}
      height={300}
    />
  );
}

type MaskPlotProps = { name: string; clock: string; points: readonly MaskedPoint[] };

/** A deviation against the interval, both in powers of ten, and the mask that it keeps under. */
function MaskPlot({ name, clock, points }: MaskPlotProps) {
  const [index, setIndex] = useState<number | null>(null);
  if (points.length < 2) return <p className="text-dense text-ink-2">{`The log is too short for ${name}.`}</p>;
  const x = points.map(({ tauS }) => Math.log10(tauS));
  // A deviation of nothing has no logarithm; it stands at the foot.
  const y = points.map(({ ns }) => Math.log10(Math.max(ns, 1e-3)));
  const mask = points.map(({ limitNs }) => Math.log10(limitNs));
  const low = Math.max(-2, Math.floor(Math.min(...y, ...mask)));
  const high = Math.max(...y, ...mask) + 0.15;
  // Where it comes nearest to its mask.
  const tightest = y.reduce((best, value, at) => (value - mask[at] > y[best] - mask[best] ? at : best), 0);
  const at = Math.min(index ?? tightest, points.length - 1);
  const { tauS, ns, limitNs } = points[tightest];
  return (
    <LinePlot
      x={{
        name: "interval, s",
        from: x[0],
        to: x[x.length - 1],
        ticks: ticksOf(x[0], x[x.length - 1], [1]),
        text: powerText,
      }}
      y={{
        name: `${name}, ns`,
        from: low,
        to: high,
        ticks: ticksOf(low, high, high - low > 1.3 ? [1] : [1, 2, 5]),
        text: powerText,
      }}
      curves={[
        { name, role: "subject", x, y },
        { name: clock, role: "reference", tone: "minus", x, y: mask, nameAt: { x: x[0], y: mask[0] + 0.06 } },
      ]}
      summary={`${name} against the interval: nearest to the limit of ${clock} at ${formatNumber(tauS)} s with ${formatNumber(ns, 1)} of ${formatNumber(limitNs, 1)} ns.`}
      cursor={{
        index: at,
        onMove: setIndex,
        lines: (point) => [
          `${formatNumber(points[point].tauS)} s`,
          `${formatNumber(points[point].ns, 2)} ns`,
          `limit ${formatNumber(points[point].limitNs, 1)} ns`,
        ],
      }}
      columns={[
        { name: "interval, s", values: points.map((point) => point.tauS), decimals: 1 },
        { name: `${name}, ns`, values: points.map((point) => point.ns), decimals: 2 },
        { name: "limit, ns", values: points.map((point) => point.limitNs), decimals: 1 },
      ]}
      height={260}
    />
  );
}

function ticksOf(from: number, to: number, steps: readonly number[]): number[] {
  const decades = Array.from({ length: Math.ceil(to) - Math.floor(from) + 1 }, (_, at) => Math.floor(from) + at);
  return decades.flatMap((decade) => steps.map((step) => decade + Math.log10(step)));
}

function powerText(logarithm: number): string {
  const value = 10 ** logarithm;
  return formatNumber(value, value < 0.95 ? Math.ceil(-logarithm - 1e-9) : 0);
}
