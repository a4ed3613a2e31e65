"use client";
import { useState } from "react";
import { GridPlot } from "@/components/plots/GridPlot";
import type { Cell } from "@/components/plots/useGridCursor";
import { Empty } from "@/components/ui/Empty";
import { formatNumber } from "@/components/ui/formatNumber";
import { Working } from "@/components/ui/Working";
import { FALSE_LOCK } from "@/lib/calculators/falseLock";
import type { FalsePeak } from "@/lib/gnss/falseLock";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { FalsePeakTable } from "./FalsePeakTable";
import { Formula } from "./Formula";
import { Reading, Verdict } from "./Reading";
import { texNumber, texQuantity } from "./texNumber";
import { useFalseLock, type FalseLocks } from "./useFalseLock";

/** Where a strong satellite answers in another one's place, how strong it looks there, and whether a search falls for it. */
export function FalseLock({ values, onChange }: CalculatorProps<typeof FALSE_LOCK>) {
  const answer = useFalseLock(values);
  const same = values.strongPrn === values.victimPrn;
  const locks = same ? null : answer;
  const highest = locks?.peaks[0];
  return (
    <CalculatorFrame
      busy={!same && (answer === null || answer.inputs !== values)}
      reading={
        <>
          {locks && <LockVerdict locks={locks} />}
          <Reading
            label="Apparent C/N0 of the highest false peak"
            value={highest?.apparentCn0DbHz ?? null}
            decimals={1}
            unit="dB-Hz"
            deciding
          >
            {highest && `${formatNumber(-highest.levelDb, 1)} dB below the strong satellite’s own peak`}
          </Reading>
        </>
      }
      fields={<CalculatorFields of={FALSE_LOCK} values={values} onChange={onChange} />}
      more={
        <>
          <Reading
            label="Chance that the search takes it"
            value={highest ? 100 * highest.detection : null}
            decimals={1}
            unit="%"
          >
            one false alarm in 1&#8239;000 searches, bins of 1/(2T), half-chip steps, at the middle of a cell
          </Reading>
          <Reading label="Doppler" value={highest?.dopplerHz ?? null} decimals={0} signed unit="Hz" />
          <Reading label="Code phase after the strong one’s" value={highest?.lagChips ?? null} unit="chip" />
          <Reading label="False peaks within 3 dB of the highest" value={locks?.peaks.length ?? null} />
        </>
      }
      below={highest && <FalsePeakTable peaks={locks!.peaks} />}
      working={
        <Formula
          tex={[
            String.raw`\left(\tfrac{C}{N_0}\right)_{\!false}=\tfrac{C}{N_0}+20\log_{10}\frac{|R(\Delta f,k)|}{1023}`,
            String.raw`R(\Delta f,k)=\sum_{n}a_n\,b_{(n+k)\bmod 1023}\,e^{\,j2\pi\Delta f\,n/R_c}`,
          ]}
          worked={highest ? [worked(locks!, highest)] : []}
          source="C/A codes: IS-GPS-200, 3.3.2.3 and Table 3-Ia; both repeat each millisecond, so that longer sums keep whole kHz only. Detection: chi-square law with 2K degrees, Kaplan and Hegarty, Understanding GPS, 2nd edition, 5.8."
        />
      }
    >
      <Places locks={locks} same={same} />
    </CalculatorFrame>
  );
}

const SURE = 0.9; // what a search must reach to count as finding; common practice, no source
const HARDLY = 0.1;

function LockVerdict({ locks: { peaks, inputs } }: { locks: FalseLocks }) {
  const chance = peaks[0].detection; // a window of 500 Hz to each side holds one place at least
  if (chance < HARDLY) return <Verdict glyph="within">The search hardly sees the false peaks</Verdict>;
  if (chance < SURE)
    return <Verdict glyph="suspended">The search may take a false peak for PRN {inputs.victimPrn}</Verdict>;
  return <Verdict glyph="outside">The search takes a false peak for PRN {inputs.victimPrn}</Verdict>;
}

function Places({ locks, same }: { locks: FalseLocks | null; same: boolean }) {
  if (same)
    return (
      <Empty title="Both are the same satellite" level={3}>
        Its own peak is no false one. Give two different numbers.
      </Empty>
    );
  if (!locks) return <Working label="Correlating the two codes at every Doppler of the window" />;
  return <PlaceMap locks={locks} />;
}

function PlaceMap({ locks }: { locks: FalseLocks }) {
  const { map, overview, peaks, inputs } = locks;
  const [moved, setMoved] = useState<{ of: FalseLocks; cell: Cell } | null>(null);
  const cell = moved?.of === locks ? moved.cell : cellOf(locks, peaks[0]);
  const power = map.power[cell.row * map.lagsChips.length + cell.column];
  const apparent = 10 * Math.log10(Math.max(1e-6, power - 1) * (1000 / inputs.coherentMs));
  return (
    <figure>
      <GridPlot
        dopplersHz={map.dopplersHz}
        lagsChips={map.lagsChips}
        power={map.power}
        overview={overview}
        cell={cell}
        onMove={(next) => setMoved({ of: locks, cell: next })}
        lines={() => [
          `${formatNumber(map.dopplersHz[cell.row], 0, true)} Hz, ${cell.column} chip`,
          `${formatNumber(apparent, 1)} dB-Hz`,
        ]}
        summary={`Search for PRN ${inputs.victimPrn} with PRN ${inputs.strongPrn} at ${formatNumber(inputs.cn0DbHz, 1)} dB-Hz: ${peaks.length} false peaks, the highest at ${formatNumber(peaks[0].dopplerHz, 0, true)} Hz and ${peaks[0].lagChips} chip.`}
        height={340}
      />
      <figcaption className="mt-2 text-dense text-ink-2">
        Mean power where false peaks can stand, rows {inputs.coherentMs === 1 ? "500 Hz" : "1 kHz"} apart; code phase
        counted from the strong satellite’s own.
      </figcaption>
    </figure>
  );
}

function cellOf({ map }: FalseLocks, { dopplerHz, lagChips }: FalsePeak): Cell {
  return { row: map.dopplersHz.findIndex((row) => Math.abs(row - dopplerHz) < 1), column: lagChips };
}

const worked = ({ inputs }: FalseLocks, { levelDb, apparentCn0DbHz, dopplerHz, lagChips }: FalsePeak) =>
  String.raw`\Delta f=${texQuantity(inputs.dopplerHz - dopplerHz, "Hz")},\ k=${lagChips}:\quad ${texNumber(inputs.cn0DbHz, 1)}${texNumber(levelDb, 2)}=${texQuantity(apparentCn0DbHz, "dB\\text{-}Hz", 1)}`;
