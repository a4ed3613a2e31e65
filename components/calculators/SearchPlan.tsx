"use client";
import { useEffect, useRef, useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { Working } from "@/components/ui/Working";
import { SEARCH_PLAN } from "@/lib/calculators/searchPlan";
import { CalculatorFields } from "./CalculatorFields";
import { CalculatorFrame } from "./CalculatorFrame";
import type { CalculatorProps } from "./calculatorProps";
import { Formula } from "./Formula";
import { Reading } from "./Reading";
import { startPlanWorker } from "./startWorkers";
import { texNumber } from "./texNumber";
import type { PlanAnswer, PlanInputs } from "./workers/plan.worker";

/** Will this search find it, and when? Detection with all losses averaged, cells, threshold and time. */
export function SearchPlan({ values, onChange }: CalculatorProps<typeof SEARCH_PLAN>) {
  const answer = usePlan(values);
  return (
    <CalculatorFrame
      busy={answer === null || answer.inputs !== values}
      reading={<Detection answer={answer} />}
      more={<PlanReadings answer={answer} />}
      fields={<CalculatorFields of={SEARCH_PLAN} values={values} onChange={onChange} />}
      working={
        <Formula
          tex={String.raw`P_D=\overline{Q_K\!\left(\sqrt{2K\rho},\sqrt{\gamma}\right)},\qquad 1-(1-p)^{N}=P_{FA},\qquad p=Q_{\chi^2_{2K}}(\gamma)`}
          worked={answer ? [worked(answer)] : []}
          source="Kaplan and Hegarty, Understanding GPS, 2nd edition, 5.8; the bar is the mean over code offset, Doppler offset and bit edges (common practice, no source)."
        />
      }
    >
      {answer ? (
        <PlanCurve answer={answer} />
      ) : (
        <Working label="Averaging over code offset, Doppler offset and bit edges" />
      )}
    </CalculatorFrame>
  );
}

function Detection({ answer }: { answer: PlanAnswer | null }) {
  return (
    <Reading
      label="Detection probability"
      value={answer ? 100 * answer.performance.detection : null}
      decimals={1}
      unit="%"
      deciding
    >
      {answer &&
        `at ${formatNumber(answer.inputs.cn0DbHz, 1)} dB-Hz, standard error ${formatNumber(100 * answer.performance.detectionStandardError, 2)} point`}
    </Reading>
  );
}

function PlanReadings({ answer }: { answer: PlanAnswer | null }) {
  const performance = answer?.performance;
  return (
    <>
      <Reading label="Time of the whole search" value={performance?.searchTimeS ?? null} decimals={3} unit="s" />
      <Reading label="Cells" value={performance?.cells ?? null} />
      <Reading label="Threshold" value={performance?.thresholdSigma2 ?? null} decimals={2} unit="sigma²">
        on the sum of all squares, noise power per component = 1
      </Reading>
      <Reading label="False alarms per cell" value={performance ? powerOfTen(performance.falseAlarmPerCell) : null} />
    </>
  );
}

const powerOfTen = (value: number) => value.toExponential(2).replace("e-", "e\u2212");

function PlanCurve({ answer: { curve, inputs, performance } }: { answer: PlanAnswer }) {
  const [index, setIndex] = useState<number | null>(null);
  return (
    <LinePlot
      x={{ name: "C/N0, dB-Hz", from: curve[0].cn0DbHz, to: curve.at(-1)!.cn0DbHz }}
      y={{ name: "detection probability, %", from: 0, to: 100 }}
      curves={[
        {
          name: "this plan",
          role: "subject",
          x: curve.map(({ cn0DbHz }) => cn0DbHz),
          y: curve.map(({ detection }) => 100 * detection),
        },
      ]}
      limits={[
        { y: 90, name: "90 %" },
        { x: inputs.cn0DbHz, name: `${formatNumber(inputs.cn0DbHz, 1)} dB-Hz`, tone: "plus" },
      ]}
      summary={`Detection probability against C/N0; ${formatNumber(100 * performance.detection, 1)} % at ${formatNumber(inputs.cn0DbHz, 1)} dB-Hz.`}
      cursor={{
        index: index ?? Math.round(inputs.cn0DbHz) - curve[0].cn0DbHz,
        onMove: setIndex,
        lines: (at) => [`${curve[at]?.cn0DbHz} dB-Hz`, `${formatNumber(100 * (curve[at]?.detection ?? 0), 1)} %`],
      }}
      height={320}
    />
  );
}

const worked = ({ inputs, performance }: PlanAnswer) =>
  String.raw`N=${texNumber(performance.cells)},\quad p=${texNumber(performance.falseAlarmPerCell, 6)},\quad \gamma=${texNumber(performance.thresholdSigma2, 2)},\quad K=${texNumber(inputs.sums)},\quad P_D=${texNumber(performance.detection, 3)}`;

/** The newest answer of the worker; an older one stays until it comes. */
function usePlan(inputs: PlanInputs): PlanAnswer | null {
  const worker = useRef<Worker | null>(null);
  const run = useRef(0);
  const asked = useRef(new Map<number, PlanInputs>());
  const [answer, setAnswer] = useState<PlanAnswer | null>(null);
  useEffect(() => {
    const own = startPlanWorker();
    const waiting = asked.current;
    own.addEventListener("message", ({ data }: MessageEvent<PlanAnswer>) => {
      const question = waiting.get(data.run);
      waiting.delete(data.run);
      if (data.run === run.current && question) setAnswer({ ...data, inputs: question });
    });
    worker.current = own;
    return () => own.terminate();
  }, []);
  useEffect(() => {
    run.current += 1;
    asked.current.set(run.current, inputs);
    worker.current?.postMessage({ run: run.current, inputs });
  }, [inputs]);
  return answer;
}
