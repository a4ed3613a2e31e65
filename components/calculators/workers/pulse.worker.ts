import { FormatError } from "@/lib/formats/FormatError";
import { readTimeErrorLog } from "@/lib/formats/readTimeErrorLog";
import { pulseReport, type PulseClock, type PulseReport } from "@/lib/gnss/timing/pulseReport";
import "./tellFiles";

export type PulseQuestion = { text: string; clock: PulseClock; leaveOut: boolean; offsetNs: number };
export type PulseAnswer =
  | { run: number; kind: "report"; report: PulseReport; readings: number; intervalS: number; valuesNs: Float64Array }
  | { run: number; kind: "refused"; line: number; message: string };

addEventListener("message", ({ data }: MessageEvent<PulseQuestion & { run: number }>) => {
  const answer = answered(data);
  postMessage(answer, { transfer: answer.kind === "report" ? [answer.valuesNs.buffer] : [] });
});

function answered({ run, text, clock, leaveOut, offsetNs }: PulseQuestion & { run: number }): PulseAnswer {
  try {
    const { series: read, readings } = readTimeErrorLog(text);
    const taken = { ...read, valuesNs: read.valuesNs.map((value) => value - offsetNs) };
    const { report, series } = pulseReport(taken, clock, leaveOut);
    return { run, kind: "report", report, readings, intervalS: series.intervalS, valuesNs: series.valuesNs };
  } catch (error) {
    if (!(error instanceof FormatError)) throw error;
    const line = "line" in error.position ? error.position.line : 1;
    return { run, kind: "refused", line, message: error.message.replace(/^\d+:\d+: /, "") };
  }
}
