import { useEffect, useRef, useState } from "react";
import { startPulseWorker } from "./startWorkers";
import type { PulseAnswer, PulseQuestion } from "./workers/pulse.worker";

/** The newest answer to a log; null while there is none, and for an empty log. A day of readings takes a while: in a worker. */
export function usePulseReport({ text, clock, leaveOut, offsetNs }: PulseQuestion): PulseAnswer | null {
  const worker = useRef<Worker | null>(null);
  const run = useRef(0);
  const [answer, setAnswer] = useState<PulseAnswer | null>(null);
  useEffect(() => {
    const own = startPulseWorker();
    own.addEventListener("message", ({ data }: MessageEvent<PulseAnswer>) => {
      if (data.run === run.current) setAnswer(data);
    });
    worker.current = own;
    return () => own.terminate();
  }, []);
  useEffect(() => {
    run.current += 1;
    if (text !== "") worker.current?.postMessage({ run: run.current, text, clock, leaveOut, offsetNs });
  }, [text, clock, leaveOut, offsetNs]);
  return text === "" ? null : answer;
}
