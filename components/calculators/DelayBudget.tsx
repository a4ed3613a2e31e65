"use client";
import { useMemo, useState } from "react";
import { WhiskerPlot, type WhiskerBar } from "@/components/plots/WhiskerPlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { DELAY_BUDGET } from "@/lib/calculators/delayBudget";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { delaysOf, type Delays } from "./delaysOf";
import { Formula } from "./Formula";
import { Reading, Verdict } from "./Reading";
import { RowsEditor } from "./RowsEditor";
import { texNumber, texQuantity } from "./texNumber";

const [PARTS] = DELAY_BUDGET.inputs;

/** The value to type into a timing receiver, how sure it is, and what a wrong held position adds. */
export function DelayBudget({ values, onChange }: CalculatorProps<typeof DELAY_BUDGET>) {
  const delays = useMemo(() => delaysOf(values), [values]);
  const { budget, entryNs, position, verdict } = delays;
  return (
    <CalculatorFrame
      reading={
        <>
          <Verdict glyph={verdict.glyph}>{verdict.text}</Verdict>
          <Reading label="Value to type in" value={entryNs} decimals={1} unit="ns" signed deciding>
            {`± ${formatNumber(budget.expandedNs, 1)} ns with coverage factor 2`}
          </Reading>
        </>
      }
      fields={<CalculatorFields of={DELAY_BUDGET} values={values} onChange={onChange} />}
      more={
        <>
          <Reading label="Delay of all parts" value={budget.totalNs} decimals={1} unit="ns" signed>
            {`standard uncertainty ${formatNumber(budget.uncertaintyNs, 2)} ns`}
          </Reading>
          <Reading label="Left with what is typed in" value={delays.leftNs} decimals={1} unit="ns" signed>
            {delays.leftNs > 0 ? "the pulse comes late" : delays.leftNs < 0 ? "the pulse comes early" : "nothing"}
          </Reading>
          <Reading label="Held position adds" value={position.meanNs} decimals={1} unit="ns" signed>
            {`± ${formatNumber(position.spreadNs, 1)} ns from satellite to satellite`}
          </Reading>
          <Reading label="Largest time error" value={delays.largestNs} decimals={1} unit="ns">
            {`of ${formatNumber(values.allowedNs, 1)} ns allowed: what is left, the held position and ± 2 u`}
          </Reading>
        </>
      }
      below={<RowsEditor input={PARTS} rows={values.parts} onChange={(parts) => onChange({ ...values, parts })} />}
      working={
        <Formula
          tex={[
            String.raw`\Delta=\sum_i \Delta_i,\qquad u^2=\sum_i u_i^2+\sum_g\Bigl(\sum_{i\in g}\pm u_i\Bigr)^{\!2}`,
            String.raw`\overline{\Delta t}=\frac{U}{c}\cdot\frac{\sin\varepsilon_1+\sin\varepsilon_2}{2}`,
          ]}
          worked={worked(delays, values.parts, values.upM)}
          source="JCGM 100:2008, 5.1.2 for independent uncertainties and 5.2.2 for those of a shared cause (g). Held position: geometry, an even sky between the two elevations."
        />
      }
    >
      <DelayBars delays={delays} parts={values.parts} />
    </CalculatorFrame>
  );
}

type Parts = CalculatorProps<typeof DELAY_BUDGET>["values"]["parts"];

function DelayBars({ delays: { budget, list }, parts }: { delays: Delays; parts: Parts }) {
  const [index, setIndex] = useState<number | null>(null);
  const bars: WhiskerBar[] = [
    ...list.map(({ ns, uncertaintyNs }, at) => ({ name: parts[at].name, value: ns, uncertainty: 2 * uncertaintyNs })),
    { name: "all", value: budget.totalNs, uncertainty: budget.expandedNs, sum: true },
  ];
  const reach = Math.max(10, ...bars.map(({ value, uncertainty }) => Math.abs(value) + uncertainty));
  const low = Math.min(0, ...bars.map(({ value, uncertainty }) => value - uncertainty));
  const at = Math.min(index ?? bars.length - 1, bars.length - 1);
  return (
    <WhiskerPlot
      y={{ name: "delay with ± 2 u, ns", from: low < 0 ? low - 0.08 * reach : 0, to: 1.08 * reach }}
      bars={bars}
      summary={`Delays of ${parts.length} parts: ${formatNumber(budget.totalNs, 1, true)} ns in all, ± ${formatNumber(budget.expandedNs, 1)} ns with coverage factor 2.`}
      cursor={{
        index: at,
        onMove: setIndex,
        lines: (bar) => [
          bars[bar].name,
          `${formatNumber(bars[bar].value, 1, true)} ns`,
          `± ${formatNumber(bars[bar].uncertainty, 1)} ns`,
        ],
      }}
      columns={[
        { name: "part", values: bars.map((_, bar) => bar + 1), decimals: 0 },
        { name: "delay, ns", values: bars.map(({ value }) => value), decimals: 1, signed: true },
        { name: "2 u, ns", values: bars.map(({ uncertainty }) => uncertainty), decimals: 2 },
      ]}
      height={320}
    />
  );
}

function worked({ budget, list, entryNs, position }: Delays, parts: Parts, upM: number) {
  const sum = list.map(({ ns }, at) => `${at > 0 && ns >= 0 ? "+" : ""}${texNumber(ns, 1)}`).join("");
  const own = parts.flatMap(({ figures }, at) =>
    figures[2] === 0 ? [`${texNumber(list[at].uncertaintyNs, 1)}^2`] : [],
  );
  const groups = [...new Set(parts.map(({ figures }) => figures[2]).filter((cause) => cause !== 0))].map(
    (cause) =>
      `(${parts
        .flatMap(({ figures }, at) =>
          figures[2] === cause ? [`${list[at].ns < 0 ? "-" : "+"}${texNumber(list[at].uncertaintyNs, 1)}`] : [],
        )
        .join("")
        .replace(/^\+/, "")})^2`,
  );
  return [
    String.raw`\Delta=${sum}=${texQuantity(budget.totalNs, "ns", 1)}\;\Rightarrow\;${texQuantity(entryNs, "ns", 1)}`,
    String.raw`u=\sqrt{${[...own, ...groups].join("+")}}=${texQuantity(budget.uncertaintyNs, "ns", 2)}`,
    String.raw`\overline{\Delta t}=\frac{${texQuantity(upM, "m", 1)}}{c}\cdot ${texNumber(position.share, 3)}=${texQuantity(position.meanNs, "ns", 2)}`,
  ];
}
