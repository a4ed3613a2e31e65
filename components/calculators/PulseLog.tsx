"use client";
import { useState } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import { Working } from "@/components/ui/Working";
import { PULSE_ERROR } from "@/lib/calculators/pulseError";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { Formula } from "./Formula";
import { LogEntry, type PastedLog } from "./LogEntry";
import { PulseCurves } from "./PulseCurves";
import { Reading, Verdict } from "./Reading";
import { texNumber, texQuantity } from "./texNumber";
import { usePulseReport } from "./usePulseReport";
import type { PulseAnswer } from "./workers/pulse.worker";

const KEYS = ["source", "clock", "triggers", "offsetNs"] as const;
/** The log of this page, for as long as the page is open: whoever looks at another calculator meanwhile finds it again. */
let kept: PastedLog = { name: null, text: "" };

/** A log of time errors against the limits of a class of clocks. The log stays on this page, whose address cannot hold it. */
export function PulseLog({ values, onChange }: CalculatorProps<typeof PULSE_ERROR>) {
  const [log, setLog] = useState(kept);
  const take = (next: PastedLog) => {
    kept = next;
    setLog(next);
  };
  const { clock, offsetNs, triggers } = values;
  const answer = usePulseReport({ text: log.text, clock, offsetNs, leaveOut: triggers === "leave-out" });
  const found = answer?.kind === "report" ? answer : null;
  return (
    <CalculatorFrame
      reading={<PulseVerdict found={found} clock={clock} />}
      fields={<CalculatorFields of={PULSE_ERROR} keys={KEYS} values={values} onChange={onChange} />}
      more={found && <PulseReadings found={found} />}
      below={
        <LogEntry
          log={log}
          onChange={take}
          problem={answer?.kind === "refused" ? `Line ${answer.line}: ${answer.message}` : null}
        />
      }
      working={
        <Formula
          tex={[
            String.raw`\max|TE|=\max_i |x_i|,\qquad \mathrm{MTIE}(n\tau_0)=\max_k\bigl(\max_{k\le i\le k+n}x_i-\min_{k\le i\le k+n}x_i\bigr)`,
            String.raw`\mathrm{TDEV}(n\tau_0)=\sqrt{\frac{1}{6n^2(N-3n+1)}\sum_j\Bigl(\sum_{i=j}^{n+j-1}(x_{i+2n}-2x_{i+n}+x_i)\Bigr)^{\!2}}`,
          ]}
          worked={found ? worked(found) : []}
          source="ITU-T G.810, 4.5.13, II.3 and II.5; max|TE| with its mean as in G.8260. Limits of PRTC-A and PRTC-B: ITU-T G.8272 (the slope of the B class' TDEV from memory)."
        />
      }
    >
      {found ? (
        <PulseCurves found={found} clock={clock} />
      ) : log.text !== "" && answer === null ? (
        <Working label="Reading the log" />
      ) : (
        <p className="border-line border-dashed border-control bg-sheet px-6 py-10 text-dense text-ink-2">
          Paste a log below, or drop its file: time error, MTIE and TDEV are drawn here against the limits of the class.
        </p>
      )}
    </CalculatorFrame>
  );
}

export type FoundPulse = Extract<PulseAnswer, { kind: "report" }>;

function PulseVerdict({ found, clock }: { found: FoundPulse | null; clock: string }) {
  if (!found)
    return (
      <>
        <Verdict glyph="todo">No log yet</Verdict>
        <Reading label="max|TE|" value={null} deciding />
      </>
    );
  const { withinMax, withinMtie, withinTdev, summary, maxLimitNs } = found.report;
  const broken = [!withinMax && "max|TE|", !withinMtie && "MTIE", !withinTdev && "TDEV"].filter(Boolean);
  return (
    <>
      <Verdict glyph={broken.length === 0 ? "within" : "outside"}>
        {broken.length === 0 ? `Keeps the limits of ${clock}` : `${broken.join(", ")} above the limit of ${clock}`}
      </Verdict>
      <Reading label="max|TE|" value={summary.maxAbsNs} decimals={1} unit="ns" deciding>
        {`of ${formatNumber(maxLimitNs)} ns, ${formatNumber((summary.at * found.intervalS) / 3600, 2)} h from the beginning`}
      </Reading>
    </>
  );
}

function PulseReadings({ found: { report, readings, intervalS, valuesNs } }: { found: FoundPulse }) {
  const { summary, outliers, step } = report;
  const missing = valuesNs.length - readings;
  return (
    <>
      <Reading label="Mean, constant part" value={summary.meanNs} decimals={1} unit="ns" signed>
        {`standard deviation ${formatNumber(summary.standardDeviationNs, 2)} ns, peak to peak ${formatNumber(summary.peakToPeakNs, 1)} ns`}
      </Reading>
      <Reading label="Readings" value={summary.count}>
        {`every ${formatNumber(intervalS, intervalS < 1 ? 2 : 0)} s, ${formatNumber(missing)} missing`}
      </Reading>
      <Reading label="Missed triggers" value={outliers.length}>
        {outliers.length > 0 && `the first ${formatNumber((outliers[0] * intervalS) / 3600, 2)} h from the beginning`}
      </Reading>
      {step && (
        <Reading label="Largest step" value={step.sizeNs} decimals={1} unit="ns" signed>
          {`${formatNumber((step.index * intervalS) / 3600, 2)} h from the beginning`}
        </Reading>
      )}
    </>
  );
}

function worked({ report: { summary, mtie, tdev } }: FoundPulse) {
  const last = mtie.at(-1);
  const slow = tdev.at(-1);
  return [
    String.raw`\max|TE|=${texQuantity(summary.maxAbsNs, "ns", 1)},\qquad \overline{TE}=${texQuantity(summary.meanNs, "ns", 1)}\;(N=${texNumber(summary.count)})`,
    ...(last
      ? [
          String.raw`\mathrm{MTIE}(${texNumber(last.tauS, 0)}\,\mathrm s)=${texQuantity(last.ns, "ns", 1)}\;(\le ${texQuantity(last.limitNs, "ns", 1)})`,
        ]
      : []),
    ...(slow
      ? [
          String.raw`\mathrm{TDEV}(${texNumber(slow.tauS, 0)}\,\mathrm s)=${texQuantity(slow.ns, "ns", 2)}\;(\le ${texQuantity(slow.limitNs, "ns", 1)})`,
        ]
      : []),
  ];
}
