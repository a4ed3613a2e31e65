"use client";
import { useEffect, useRef, useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { Ledger } from "@/components/ui/Ledger";
import { Value } from "@/components/ui/Value";
import { Working } from "@/components/ui/Working";
import { Formula } from "./Formula";
import { NumberInput } from "./NumberInput";
import type { PlanAnswer, PlanInputs } from "./workers/plan.worker";

export type SearchPlanProps = Partial<PlanInputs>;

const START: PlanInputs = {
  cn0DbHz: 34,
  coherentMs: 4,
  sums: 10,
  dopplerBinHz: 125,
  codeStepChips: 0.5,
  windowHz: 5000,
  falseAlarmPerSearch: 1e-3,
  correlators: 1000,
};

const INPUTS = [
  { key: "cn0DbHz", label: "C/N0", unit: "dB-Hz", from: 20, to: 55, decimals: 1 },
  { key: "coherentMs", label: "Coherent time", unit: "ms", from: 1, to: 20, whole: true },
  { key: "sums", label: "Sums", from: 1, to: 500, whole: true },
  { key: "dopplerBinHz", label: "Doppler bin", unit: "Hz", from: 10, to: 1000 },
  { key: "codeStepChips", label: "Code step", unit: "chip", from: 0.1, to: 1, decimals: 2 },
  { key: "windowHz", label: "Window ±", unit: "Hz", from: 0, to: 20_000 },
  { key: "falseAlarmPerSearch", label: "False alarms per search", from: 1e-9, to: 0.1, scientific: true },
  { key: "correlators", label: "Correlators", from: 1, to: 1_000_000, whole: true },
] as const;

/** Will this search find it, and when? Detection with all losses averaged, cells, threshold and time. */
export function SearchPlan(props: SearchPlanProps) {
  const [inputs, setInputs] = useState<PlanInputs>(() => ({ ...START, ...given(props) }));
  const answer = usePlan(inputs);
  const [cn0Index, setCn0Index] = useState<number | null>(null);
  const busy = answer === null || answer.inputs !== inputs;
  return (
    <div className="@container">
      <div className="grid gap-x-8 gap-y-5 @3xl:grid-cols-[1fr_15rem]">
        <div className="min-w-0" aria-busy={busy}>
          {answer === null ? (
            <Working label="Averaging over code offset, Doppler offset and bit edges" />
          ) : (
            <>
              <div className="flex flex-wrap items-end gap-x-10 gap-y-3">
                <div>
                  <p className="text-label font-normal text-ink-2">Detection probability</p>
                  <p>
                    <Value value={100 * answer.performance.detection} decimals={1} unit="%" size="l" />
                  </p>
                </div>
                <p className="pb-1 text-dense text-ink-2 figures">
                  at {formatNumber(answer.inputs.cn0DbHz, 1)} dB-Hz, standard error{" "}
                  {formatNumber(100 * answer.performance.detectionStandardError, 2)} point
                </p>
              </div>
              <LinePlot
                x={{ name: "C/N0, dB-Hz", from: answer.curve[0]!.cn0DbHz, to: answer.curve.at(-1)!.cn0DbHz }}
                y={{ name: "detection probability, %", from: 0, to: 100 }}
                curves={[
                  {
                    name: "this plan",
                    role: "subject",
                    x: answer.curve.map(({ cn0DbHz }) => cn0DbHz),
                    y: answer.curve.map(({ detection }) => 100 * detection),
                  },
                ]}
                limits={[{ y: 90, name: "90 %" }]}
                summary={`Detection probability against C/N0; ${formatNumber(100 * answer.performance.detection, 1)} % at ${formatNumber(answer.inputs.cn0DbHz, 1)} dB-Hz.`}
                cursor={{
                  index: cn0Index ?? Math.round(answer.inputs.cn0DbHz) - answer.curve[0]!.cn0DbHz,
                  onMove: setCn0Index,
                  lines: (index) => [
                    `${answer.curve[index]?.cn0DbHz} dB-Hz`,
                    `${formatNumber(100 * (answer.curve[index]?.detection ?? 0), 1)} %`,
                  ],
                }}
                height={240}
              />
              <Ledger
                className="mt-4"
                rows={[
                  { label: "Cells", value: formatNumber(answer.performance.cells) },
                  {
                    label: "Threshold",
                    value: `${formatNumber(answer.performance.thresholdSigma2, 2)} sigma²`,
                    detail: "on the sum of all squares, noise power per component = 1",
                  },
                  { label: "False alarms per cell", value: answer.performance.falseAlarmPerCell.toExponential(2) },
                  { label: "Time of the whole search", value: `${formatNumber(answer.performance.searchTimeS, 3)} s` },
                ]}
              />
            </>
          )}
          <Formula
            tex={String.raw`P_D=\overline{Q_K\!\left(\sqrt{2K\rho},\sqrt{\gamma}\right)},\qquad 1-(1-p)^{N}=P_{FA},\qquad p=Q_{\chi^2_{2K}}(\gamma)`}
            source="Kaplan and Hegarty, Understanding GPS, 2nd edition, 5.8; the bar is the mean over code offset, Doppler offset and bit edges (common practice, no source)."
          />
        </div>
        <div className="grid grid-cols-2 content-start gap-4 @xl:grid-cols-4 @3xl:grid-cols-1">
          {INPUTS.map(({ key, ...input }) => (
            <NumberInput
              key={key}
              {...input}
              value={inputs[key]}
              onChange={(value) => setInputs({ ...inputs, [key]: value })}
            />
          ))}
        </div>
      </div>
    </div>
  );
}

const given = (props: SearchPlanProps): Partial<PlanInputs> =>
  Object.fromEntries(Object.entries(props).filter(([, value]) => value !== undefined));

/** The newest answer of the worker; an older one stays until it comes. */
function usePlan(inputs: PlanInputs): PlanAnswer | null {
  const worker = useRef<Worker | null>(null);
  const run = useRef(0);
  const asked = useRef(new Map<number, PlanInputs>());
  const [answer, setAnswer] = useState<PlanAnswer | null>(null);
  useEffect(() => {
    const own = new Worker(new URL("./workers/plan.worker.ts", import.meta.url), { type: "module" });
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
