"use client";
import { useState } from "react";
import { LinePlot, type Curve } from "@/components/plots/LinePlot";
import type { TableColumn } from "@/components/plots/PlotTable";
import { formatNumber } from "@/components/ui/formatNumber";
import { decibels } from "@/lib/numeric/elementary";
import { noiseDensityDbmHz } from "@/lib/gnss/linkBudget";
import type { Chain, ChainValues } from "./chainOf";

/** Stages along x, level above: satellite, noise floor, neighbour, and what each part stands before it compresses. */
export function LevelDiagram({ values, chain }: { values: ChainValues; chain: Chain }) {
  const [index, setIndex] = useState<number | null>(null);
  const names = ["antenna", ...values.parts.map(({ name }) => name)];
  const x = names.map((_, at) => at);
  const bandDb = decibels(values.bandwidthMHz * 1e6);
  const signal = [values.signalDbm, ...chain.levels.map(({ signalDbm }) => signalDbm)];
  const floor = [noiseDensityDbmHz(values.antennaK), ...chain.levels.map(({ noiseDbmHz }) => noiseDbmHz)].map(
    (density) => density + bandDb,
  );
  const { strongDbm } = values;
  const strong = strongDbm === null ? null : [strongDbm, ...chain.levels.map((level) => level.strongDbm ?? NaN)];
  const points = values.parts.map(({ figures }) => figures[2]);
  const ceilings = points.flatMap((y, at) =>
    y === null ? [] : [{ x: at + 1, y, kept: chain.levels[at].headroomDb >= 0 }],
  );
  const all = [...signal, ...floor, ...(strong ?? []), ...ceilings.map(({ y }) => y)];
  const end = names.length - 1;
  const curves: Curve[] = [
    { name: "satellite", role: "subject", x, y: signal, nameAt: nameAt(signal, -9) },
    { name: "noise floor", role: "reference", tone: "ink", x, y: floor, nameAt: nameAt(floor, 4) },
    ...(strong ? [{ name: "neighbour", tone: "minus" as const, x, y: strong, nameAt: nameAt(strong, 4) }] : []),
  ];
  const at = Math.min(index ?? end, end);
  const columns: TableColumn[] = [
    { name: "stage", values: x, decimals: 0 },
    { name: "satellite, dBm", values: signal, decimals: 1, signed: true },
    { name: "noise floor, dBm", values: floor, decimals: 1, signed: true },
    ...(strong ? [{ name: "neighbour, dBm", values: strong, decimals: 1, signed: true }] : []),
    { name: "1 dB point, dBm", values: [NaN, ...points.map((point) => point ?? NaN)], decimals: 1, signed: true },
  ];
  return (
    <LinePlot
      x={{ name: "stage", from: -0.25, to: end + 0.25, ticks: x, text: shortName(names) }}
      y={{ name: "level, dBm", from: Math.min(...all) - 12, to: Math.max(...all) + 12 }}
      curves={curves}
      marks={ceilings}
      summary={summaryOf(chain, names[end])}
      cursor={{ index: at, onMove: setIndex, lines: (stage) => linesOf(chain, names, stage, signal, strong) }}
      columns={columns}
      height={360}
    />
  );
}

/** A name stands beside its curve in the middle, where the cursor seldom is. */
function nameAt(levels: readonly number[], overDb: number) {
  const middle = Math.floor((levels.length - 1) / 2);
  return { x: middle, y: levels[middle] + overDb };
}

/** Names of a short chain, of a long one the stages' numbers: the cursor says the name. */
const shortName = (names: readonly string[]) => (stage: number) => (names.length <= 6 ? names[stage] : `${stage}`);

const summaryOf = ({ last, cn0DbHz, headroomDb, tightest }: Chain, name: string) =>
  `Levels along the chain: after ${name} a net gain of ${formatNumber(last.gainDb, 1, true)} dB, C/N0 ${formatNumber(cn0DbHz, 1)} dB-Hz${
    headroomDb === null ? "" : `, least headroom ${formatNumber(headroomDb, 1, true)} dB in ${tightest}`
  }.`;

function linesOf(
  { levels }: Chain,
  names: readonly string[],
  stage: number,
  signal: readonly number[],
  strong: readonly number[] | null,
): string[] {
  const level = stage === 0 ? null : levels[stage - 1];
  return [
    names[stage],
    `satellite ${formatNumber(signal[stage], 1, true)} dBm`,
    ...(level ? [`C/N0 ${formatNumber(level.cn0DbHz, 1)} dB-Hz`] : []),
    ...(strong ? [`neighbour ${formatNumber(strong[stage], 1, true)} dBm`] : []),
    ...(level && Number.isFinite(level.headroomDb) ? [`headroom ${formatNumber(level.headroomDb, 1, true)} dB`] : []),
  ];
}
