"use client";
import { useMemo } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { TWO_CODES } from "@/lib/calculators/twoCodes";
import { caCode } from "@/lib/gnss/caCode";
import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { circularCorrelation } from "@/lib/gnss/correlation";
import { dopplerCorrelation } from "@/lib/gnss/crossCorrelation";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { Formula } from "./Formula";
import { Reading } from "./Reading";
import { texNumber } from "./texNumber";

/** Gold's bound for codes of length 1 023: the side lobes of two codes without a Doppler difference. Gold 1967. */
const FLOOR = { y: [-65, 63] as const, name: "floor 63 to \u221265", tone: "ink" as const };
const LAGS = Float64Array.from({ length: CA_LENGTH_CHIPS }, (_, lag) => lag);

/** How alike two C/A codes are, lag by lag, with or without a Doppler difference. */
export function TwoCodes({ values: inputs, onChange }: CalculatorProps<typeof TWO_CODES>) {
  const { a, b, dopplerHz, coherentMs, lagChips } = inputs;
  const values = useMemo(() => correlate(a, b, dopplerHz, coherentMs), [a, b, dopplerHz, coherentMs]);
  const top = useMemo(() => highest(values), [values]);
  const lag = lagChips ?? top;
  const reach = Math.max(80, ...Array.from(values, Math.abs)) * 1.06;
  const exact = dopplerHz === 0;
  const decimals = exact ? 0 : 1;
  const name = a === b ? `code ${a} with itself` : `code ${a} against code ${b}`;
  return (
    <CalculatorFrame
      reading={
        <Reading label="Highest agreement" value={values[top]} decimals={decimals} unit="chip" deciding>
          {level(values[top])} at lag {top} chip
        </Reading>
      }
      more={
        <Reading label={`At lag ${lag} chip`} value={values[lag]} decimals={decimals} unit="chip">
          {level(values[lag])}
        </Reading>
      }
      fields={<CalculatorFields of={TWO_CODES} values={inputs} onChange={onChange} />}
      working={
        <Formula
          tex={
            exact
              ? String.raw`R_{ab}[k]=\sum_{n=0}^{1022} a_n\,b_{(n+k)\bmod 1023}`
              : String.raw`R_{ab}[k]=\Bigl|\sum_{n} a_n\,b_{(n+k)\bmod 1023}\,e^{\,j2\pi \Delta f\,n/R_c}\Bigr|`
          }
          worked={[
            String.raw`R_{${a},${b}}[${lag}]=${texNumber(values[lag], decimals)}`,
            String.raw`20\log_{10}\frac{${texNumber(Math.abs(values[lag]), decimals)}}{1023}=${texNumber(levelDb(values[lag]), 1)}\,\mathrm{dB}`,
          ]}
          source="C/A codes: IS-GPS-200, 3.3.2.3 and Table 3-Ia. Three values 63, −1, −65 without Doppler difference: Gold, 1967."
        />
      }
    >
      <LinePlot
        x={{ name: "lag, chip", from: 0, to: CA_LENGTH_CHIPS - 1 }}
        y={{
          name: exact ? "agreement R, chips of 1\u2009023" : "agreement |R|, chips of 1\u2009023",
          from: exact ? -Math.max(80, reach * 0.12) : 0,
          to: reach,
        }}
        curves={[{ name, role: "subject", x: LAGS, y: values }]}
        bands={exact ? [FLOOR] : undefined}
        summary={`Correlation of ${name}: highest ${formatNumber(values[top], decimals)} chip at lag ${top} chip, ${level(values[top])}.`}
        cursor={{
          index: lag,
          onMove: (lagChips) => onChange({ ...inputs, lagChips }),
          lines: (index) => [
            `lag ${index} chip`,
            `R ${formatNumber(values[index], decimals)} chip`,
            level(values[index]),
          ],
        }}
        height={320}
      />
    </CalculatorFrame>
  );
}

/** Whole chips without a Doppler difference, else the magnitude. */
function correlate(a: number, b: number, dopplerHz: number, coherentMs: number): Float64Array {
  if (dopplerHz === 0) return Float64Array.from(circularCorrelation(caCode(a), caCode(b)));
  return dopplerCorrelation(caCode(a), caCode(b), dopplerHz, coherentMs / 1000);
}

function highest(values: Float64Array): number {
  let best = 0;
  for (let at = 1; at < values.length; at++) if (Math.abs(values[at]) > Math.abs(values[best])) best = at;
  return best;
}

const levelDb = (chips: number) => 20 * Math.log10(Math.abs(chips) / CA_LENGTH_CHIPS);
const level = (chips: number) => (chips === 0 ? "nothing" : `${formatNumber(levelDb(chips), 1)} dB`);
