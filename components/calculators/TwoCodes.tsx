"use client";
import { useMemo, useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { Value } from "@/components/ui/Value";
import { caCode } from "@/lib/gnss/caCode";
import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { circularCorrelation } from "@/lib/gnss/correlation";
import { dopplerCorrelation } from "@/lib/gnss/crossCorrelation";
import { Formula } from "./Formula";
import { NumberInput } from "./NumberInput";

export type TwoCodesProps = { a?: number; b?: number; dopplerHz?: number; lagChips?: number; coherentMs?: number };

/** Gold's bound for codes of length 1 023: the side lobes of two codes without a Doppler difference. Gold 1967. */
const FLOOR = { y: [-65, 63] as const, name: "floor 63 to \u221265", tone: "ink" as const };

/** How alike two C/A codes are, lag by lag, with or without a Doppler difference. */
export function TwoCodes({
  a: a0 = 1,
  b: b0 = 2,
  dopplerHz: doppler0 = 0,
  lagChips: lag0,
  coherentMs: coherent0 = 1,
}: TwoCodesProps) {
  const [a, setA] = useState(a0);
  const [b, setB] = useState(b0);
  const [dopplerHz, setDopplerHz] = useState(doppler0);
  const [coherentMs, setCoherentMs] = useState(coherent0);
  const values = useMemo(() => correlate(a, b, dopplerHz, coherentMs), [a, b, dopplerHz, coherentMs]);
  const lags = useMemo(() => Float64Array.from({ length: CA_LENGTH_CHIPS }, (_, lag) => lag), []);
  const top = useMemo(() => highest(values), [values]);
  const [chosen, setChosen] = useState<number | null>(lag0 ?? null);
  const lag = Math.round(chosen ?? top) % CA_LENGTH_CHIPS;
  const reach = Math.max(80, ...Array.from(values, Math.abs)) * 1.06;
  const exact = dopplerHz === 0;
  const name = a === b ? `code ${a} with itself` : `code ${a} against code ${b}`;
  return (
    <div className="@container">
      <div className="grid gap-x-8 gap-y-5 @3xl:grid-cols-[1fr_15rem]">
        <div className="min-w-0">
          <LinePlot
            x={{ name: "lag, chip", from: 0, to: CA_LENGTH_CHIPS - 1 }}
            y={{
              name: exact ? "R, chip" : "|R|, chip",
              from: exact ? -Math.max(80, reach * 0.12) : 0,
              to: reach,
              signed: false,
            }}
            curves={[{ name, role: "subject", x: lags, y: values }]}
            bands={exact ? [FLOOR] : undefined}
            summary={`Correlation of ${name}: highest ${formatNumber(values[top]!, exact ? 0 : 1)} chip at lag ${top} chip, ${level(values[top]!)}.`}
            cursor={{
              index: lag,
              onMove: setChosen,
              lines: (index) => [
                `lag ${index} chip`,
                `R ${formatNumber(values[index]!, exact ? 0 : 1)} chip`,
                level(values[index]!),
              ],
            }}
            height={260}
          />
          <Formula
            tex={
              exact
                ? String.raw`R_{ab}[k]=\sum_{n=0}^{1022} a_n\,b_{(n+k)\bmod 1023}`
                : String.raw`R_{ab}[k]=\Bigl|\sum_{n} a_n\,b_{(n+k)\bmod 1023}\,e^{\,j2\pi \Delta f\,n/R_c}\Bigr|`
            }
            source="C/A codes: IS-GPS-200, 3.3.2.3 and Table 3-Ia. Three values 63, −1, −65 without Doppler difference: Gold, 1967."
          />
        </div>
        <div className="grid grid-cols-2 content-start gap-4 @3xl:grid-cols-1">
          <div className="col-span-full border-b-hair border-rule pb-3">
            <p className="text-label font-normal text-ink-2">Highest agreement</p>
            <p>
              <Value value={values[top]!} decimals={exact ? 0 : 1} unit="chip" size="m" />
            </p>
            <p className="text-dense text-ink-2 figures">
              {level(values[top]!)} at lag {top} chip
            </p>
          </div>
          <NumberInput label="Code a, PRN" value={a} onChange={setA} from={1} to={32} whole />
          <NumberInput label="Code b, PRN" value={b} onChange={setB} from={1} to={32} whole />
          <NumberInput
            label="Doppler difference"
            unit="Hz"
            value={dopplerHz}
            onChange={setDopplerHz}
            from={-10_000}
            to={10_000}
            signed
          />
          <NumberInput
            label="Coherent time"
            unit="ms"
            value={coherentMs}
            onChange={setCoherentMs}
            from={1}
            to={20}
            whole
          />
          <NumberInput
            label="Lag"
            unit="chip"
            value={lag}
            onChange={setChosen}
            from={0}
            to={CA_LENGTH_CHIPS - 1}
            whole
          />
        </div>
      </div>
    </div>
  );
}

/** Whole chips without a Doppler difference, else the magnitude. */
function correlate(a: number, b: number, dopplerHz: number, coherentMs: number): Float64Array {
  if (dopplerHz === 0) return Float64Array.from(circularCorrelation(caCode(a), caCode(b)));
  return dopplerCorrelation(caCode(a), caCode(b), dopplerHz, coherentMs / 1000);
}

function highest(values: Float64Array): number {
  let best = 0;
  for (let at = 1; at < values.length; at++) if (Math.abs(values[at]!) > Math.abs(values[best]!)) best = at;
  return best;
}

const level = (chips: number) =>
  chips === 0 ? "nothing" : `${formatNumber(20 * Math.log10(Math.abs(chips) / CA_LENGTH_CHIPS), 1)} dB`;
