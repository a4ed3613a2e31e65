"use client";
import { useMemo, useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import type { ValuesOf } from "@/lib/calculators/calculator";
import { PULSE_ERROR } from "@/lib/calculators/pulseError";
import {
  holdoverErrorNs,
  holdoverUncertaintyNs,
  timeToLimitS,
  type Holdover,
  type HoldoverUncertainty,
} from "@/lib/gnss/timing/holdover";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { Formula } from "./Formula";
import { Reading, Verdict } from "./Reading";
import { texNumber, texQuantity } from "./texNumber";

const KEYS = [
  ...(["source", "startNs", "frequencyOffset", "driftPerDay", "perKelvin", "changeK", "swingK"] as const),
  ...(["frequencyUncertainty", "allowedNs", "hours"] as const),
];
const HORIZON_H = 240;
const POINTS = 240;

/** How far a clock runs away without its reference, and when that is too much. */
export function PulseHoldover({ values, onChange }: CalculatorProps<typeof PULSE_ERROR>) {
  const run = useMemo(() => runOf(values), [values]);
  const holds = run.limitH > values.hours;
  return (
    <CalculatorFrame
      reading={
        <>
          <Verdict glyph={holds ? "within" : "outside"}>
            {holds ? "Lasts through the outage" : "Does not last through the outage"}
          </Verdict>
          <Reading
            label={`Time to ± ${formatNumber(values.allowedNs)} ns`}
            value={Number.isFinite(run.limitH) ? run.limitH : `more than ${HORIZON_H}`}
            decimals={1}
            unit="h"
            deciding
          >
            expected error and two uncertainties together
          </Reading>
        </>
      }
      fields={<CalculatorFields of={PULSE_ERROR} keys={KEYS} values={values} onChange={onChange} />}
      more={
        <>
          <Reading
            label={`Expected after ${formatNumber(values.hours, 1)} h`}
            value={run.endNs}
            decimals={1}
            unit="ns"
            signed
          >
            {`± ${formatNumber(2 * run.endUncertaintyNs, 1)} ns with coverage factor 2`}
          </Reading>
        </>
      }
      working={
        <Formula
          tex={String.raw`x(t)=x_0+\left(y_0+k\,\Delta T\right)t+\tfrac12 D\,t^2+k\,\hat T\,\frac{86\,400\,\mathrm s}{\pi}\sin^2\!\frac{\pi t}{86\,400\,\mathrm s}`}
          worked={worked(values, run)}
          source="ITU-T G.810, I.3 for start, frequency offset and ageing; temperature by the definition of the coefficient, its daily wave added up over time."
        />
      }
    >
      <HoldoverPlot values={values} run={run} />
    </CalculatorFrame>
  );
}

type Values = ValuesOf<typeof PULSE_ERROR>;

function runOf(values: Values) {
  const clock: Holdover = {
    startNs: values.startNs,
    frequencyOffset: values.frequencyOffset,
    driftPerDay: values.driftPerDay,
    temperatureCoefficientPerK: values.perKelvin,
    temperatureChangeK: values.changeK,
    dailySwingK: values.swingK,
  };
  const sure: HoldoverUncertainty = {
    startNs: 0,
    frequencyOffset: values.frequencyUncertainty,
    driftPerDay: 0,
    allanFloor: 0,
  };
  const endS = values.hours * 3600;
  return {
    at: (hours: number) => holdoverErrorNs(clock, hours * 3600),
    uncertaintyAt: (hours: number) => holdoverUncertaintyNs(sure, hours * 3600),
    endNs: holdoverErrorNs(clock, endS),
    endUncertaintyNs: holdoverUncertaintyNs(sure, endS),
    limitH: timeToLimitS(clock, sure, values.allowedNs, { horizonS: HORIZON_H * 3600 }) / 3600,
  };
}
type Run = ReturnType<typeof runOf>;

function HoldoverPlot({ values, run }: { values: Values; run: Run }) {
  const [index, setIndex] = useState(POINTS);
  const x = useMemo(() => Array.from({ length: POINTS + 1 }, (_, at) => (values.hours * at) / POINTS), [values.hours]);
  const y = x.map(run.at);
  const twice = x.map((hours) => 2 * run.uncertaintyAt(hours));
  const above = y.map((value, at) => value + twice[at]);
  const below = y.map((value, at) => value - twice[at]);
  const { allowedNs } = values;
  const far = Math.max(...above.map(Math.abs), ...below.map(Math.abs));
  const reach = Math.min(Math.max(1.15 * far, 1.25 * allowedNs), 4 * Math.max(far, 1));
  const low = Math.min(...below, far > 0.2 * allowedNs ? -1.15 * allowedNs : 0);
  return (
    <LinePlot
      x={{ name: "time without reference, h", from: 0, to: values.hours }}
      y={{ name: "time error, ns", from: Math.max(-reach, 1.05 * low), to: reach, signed: true }}
      curves={[
        { name: "expected", role: "subject", x, y },
        { name: "and two uncertainties", role: "reference", tone: "ink", x, y: above },
        { name: "less two uncertainties", role: "reference", tone: "ink", x, y: below },
      ]}
      bands={[{ y: [-allowedNs, allowedNs] }]}
      limits={[
        { y: allowedNs, name: `allowed ${formatNumber(allowedNs)} ns`, tone: "minus" },
        { y: -allowedNs, name: `allowed \u2212${formatNumber(allowedNs)} ns`, tone: "minus" },
        ...(run.limitH < values.hours ? [{ x: run.limitH, name: `${formatNumber(run.limitH, 1)} h` }] : []),
      ]}
      summary={`Time error in holdover: ${formatNumber(run.endNs, 1, true)} ns expected after ${formatNumber(values.hours, 1)} h.`}
      cursor={{
        index,
        onMove: setIndex,
        lines: (at) => [
          `${formatNumber(x[at], 1)} h`,
          `${formatNumber(y[at], 1, true)} ns`,
          `± ${formatNumber(twice[at], 1)} ns`,
        ],
      }}
      columns={[
        { name: "time, h", values: x, decimals: 2 },
        { name: "expected, ns", values: y, decimals: 1, signed: true },
        { name: "two uncertainties, ns", values: twice, decimals: 1 },
      ]}
      height={340}
    />
  );
}

function worked(values: Values, run: Run) {
  const seconds = texNumber(values.hours * 3600, 0);
  const steady = values.frequencyOffset + values.perKelvin * values.changeK;
  return [
    String.raw`y_0+k\,\Delta T=${texNumber(values.frequencyOffset)}+${texNumber(values.perKelvin)}\cdot ${texNumber(values.changeK, 1)}=${texNumber(steady)}`,
    String.raw`x=${texQuantity(values.startNs, "ns", 1)}+${texNumber(steady)}\cdot ${seconds}\,\mathrm s+\tfrac12\cdot\tfrac{${texNumber(values.driftPerDay)}}{86\,400\,\mathrm s}\,(${seconds}\,\mathrm s)^2+\dots=${texQuantity(run.endNs, "ns", 1)}`,
    String.raw`2u=2\cdot ${texNumber(values.frequencyUncertainty)}\cdot ${seconds}\,\mathrm s=${texQuantity(2 * run.endUncertaintyNs, "ns", 1)}`,
  ];
}
