"use client";
import { useMemo, useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { Key } from "@/components/ui/Key";
import { TwoWay } from "@/components/ui/TwoWay";
import { bandPower } from "@/lib/gnss/interference/bandReading";
import type { Spectrum } from "@/lib/gnss/interference/spectrum";
import { decibels, pow10Db } from "@/lib/numeric/elementary";
import type { Reading } from "./reading";
import { Reading as Figure } from "./Reading";

type SpectrumReaderProps = {
  spectrum: Spectrum;
  /** |x|^2 of full scale, in the samples' units. */
  fullScale: number;
  onTake?: (reading: Reading) => void;
};

type Marks = { lowHz: number | null; highHz: number | null; floorDb: number | null };

const MHZ = 1e6;
const SPANS = [
  { value: "whole", label: "Whole band" },
  { value: "1000", label: "1 MHz" },
  { value: "100", label: "100 kHz" },
];
const DEEPEST_DB = -90; // an empty bin has no depth

/** An averaged spectrum: cursor, two edges and a floor to mark, and the power between the edges. */
export function SpectrumReader({ spectrum, fullScale, onTake }: SpectrumReaderProps) {
  const [offsetHz, setOffsetHz] = useState(0);
  const [span, setSpan] = useState("whole");
  const [marks, setMarks] = useState<Marks>({ lowHz: null, highHz: null, floorDb: null });
  const { x, y } = useMemo(() => shownPart(spectrum, fullScale, span, offsetHz), [spectrum, fullScale, span, offsetHz]);
  const index = nearest(x, offsetHz / 1000);
  const level = y[index]!;
  const band = bandOf(spectrum, fullScale, marks);
  const [low, high] = [Math.min(...y), Math.max(...y)];
  const resolution = `${formatNumber(spectrum.resolutionHz / 1000, 2)} kHz`;
  return (
    <div className="grid gap-4">
      <TwoWay name="spectrum-span" label="Shown" showLabel choices={SPANS} value={span} onChange={setSpan} />
      <LinePlot
        x={{ name: "from the centre, kHz", from: x[0]!, to: x[x.length - 1]!, signed: true }}
        y={{
          name: "dB of full scale in 1 MHz",
          from: 5 * Math.floor(low / 5),
          to: 5 * Math.ceil((high + 1) / 5),
          decimals: 1,
        }}
        curves={[{ name: "density", role: "subject", x, y }]}
        bands={band ? [{ x: [band.lowHz / 1000, band.highHz / 1000], tone: "ink" }] : []}
        limits={marks.floorDb === null ? [] : [{ y: marks.floorDb, name: "floor" }]}
        summary={`Averaged spectrum, resolution ${resolution}.`}
        cursor={{
          index,
          onMove: (at) => setOffsetHz(x[at]! * 1000),
          lines: (at) => [`${formatNumber(x[at]!, 2, true)} kHz`, `${formatNumber(y[at]!, 1, true)} dB`],
        }}
        height={280}
      />
      <p className="text-label font-normal text-ink-2 figures">
        Resolution {resolution};{" "}
        {spectrum.averaged === 1 ? "one transform" : `${formatNumber(spectrum.averaged)} transforms averaged`}.
      </p>
      <p className="flex flex-wrap gap-3 no-print">
        <Key size="small" onClick={() => setMarks({ ...marks, lowHz: offsetHz })}>
          Edge here
        </Key>
        <Key size="small" onClick={() => setMarks({ ...marks, highHz: offsetHz })}>
          Other edge here
        </Key>
        <Key size="small" onClick={() => setMarks({ ...marks, floorDb: level })}>
          Floor here
        </Key>
        <Key
          size="small"
          reason={band ? null : "Mark two edges first."}
          onClick={() => band && setMarks({ ...marks, floorDb: band.meanDb })}
        >
          Floor: mean between the edges
        </Key>
      </p>
      <div className="grid gap-4 tablet:grid-cols-2">
        <Figure label="Middle of the edges" value={band ? band.centreHz / 1000 : null} decimals={1} signed unit="kHz" />
        <Figure label="Between the edges" value={band ? band.widthHz / 1000 : null} decimals={1} unit="kHz" />
        <Figure label="Floor in 1 MHz" value={marks.floorDb} decimals={1} signed unit="dB" />
        <Figure
          label="Between the edges, over the floor in 1 MHz"
          value={band?.levelDb ?? null}
          decimals={1}
          signed
          unit="dB"
        >
          {band && marks.floorDb === null ? "Mark the floor." : "The floor itself is taken off."}
        </Figure>
      </div>
      {onTake && (
        <p className="flex flex-wrap gap-3">
          <Key reason={band ? null : "Mark two edges first."} onClick={() => band && onTake(band.reading)}>
            Take middle, width and level
          </Key>
          <Key
            reason={marks.floorDb === null ? "Mark the floor first." : null}
            onClick={() => marks.floorDb !== null && onTake({ floorDb: marks.floorDb })}
          >
            Take floor
          </Key>
        </p>
      )}
    </div>
  );
}

/** Density in dB of full scale in 1 MHz against kHz, all of it or so many kHz about the cursor. */
function shownPart({ offsetsHz, densityPerHz }: Spectrum, fullScale: number, span: string, aroundHz: number) {
  const half = span === "whole" ? Infinity : Number(span) * 500;
  const from = offsetsHz.findIndex((hz) => hz >= aroundHz - half);
  const to = offsetsHz.findLastIndex((hz) => hz <= aroundHz + half) + 1;
  return {
    x: offsetsHz.slice(from, to).map((hz) => hz / 1000),
    y: densityPerHz.slice(from, to).map((density) => Math.max(DEEPEST_DB, decibels((density * MHZ) / fullScale))),
  };
}

function nearest(x: Float64Array, value: number): number {
  let best = 0;
  for (let n = 1; n < x.length; n++) if (Math.abs(x[n]! - value) < Math.abs(x[best]! - value)) best = n;
  return best;
}

function bandOf(spectrum: Spectrum, fullScale: number, { lowHz: one, highHz: other, floorDb }: Marks) {
  if (one === null || other === null) return null;
  const [lowHz, highHz] = [Math.min(one, other), Math.max(one, other)];
  const [centreHz, widthHz] = [(lowHz + highHz) / 2, highHz - lowHz];
  const share = bandPower(spectrum, lowHz, highHz) / fullScale;
  const meanDb = decibels(Math.max(1e-12, (share * MHZ) / Math.max(widthHz, 1)));
  const floorShare = floorDb === null ? null : pow10Db(floorDb);
  const excess = floorShare === null ? null : (share - (floorShare * widthHz) / MHZ) / floorShare;
  const levelDb = excess !== null && excess > 0 ? decibels(excess) : null;
  const reading: Reading = { centreKhz: centreHz / 1000, widthKhz: widthHz / 1000, levelDb: levelDb ?? undefined };
  return { lowHz, highHz, centreHz, widthHz, meanDb, levelDb, reading };
}
