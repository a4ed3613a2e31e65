"use client";
import { useEffect, useRef, useState } from "react";
import type { FALSE_LOCK } from "@/lib/calculators/falseLock";
import type { ValuesOf } from "@/lib/calculators/calculator";
import { startFalseLockWorker } from "./startWorkers";
import type { FalseLockAnswer, FalseLockRequest } from "./workers/falseLock.worker";

export type FalseLockInputs = ValuesOf<typeof FALSE_LOCK>;
export type FalseLocks = Omit<FalseLockAnswer, "run"> & { inputs: FalseLockInputs };

/** False peaks computed off the page's own thread; an older answer stays until the newest comes. */
export function useFalseLock(inputs: FalseLockInputs): FalseLocks | null {
  const worker = useRef<Worker | null>(null);
  const newest = useRef<{ run: number; inputs: FalseLockInputs }>({ run: 0, inputs });
  const [answer, setAnswer] = useState<FalseLocks | null>(null);
  useEffect(() => {
    const own = startFalseLockWorker();
    own.addEventListener("message", ({ data: { run, ...found } }: MessageEvent<FalseLockAnswer>) => {
      if (run === newest.current.run) setAnswer({ ...found, inputs: newest.current.inputs });
    });
    worker.current = own;
    return () => own.terminate();
  }, []);
  useEffect(() => {
    newest.current = { run: newest.current.run + 1, inputs };
    const { strongPrn, victimPrn, cn0DbHz, dopplerHz, coherentMs, sums, windowHz } = inputs;
    if (strongPrn === victimPrn) return;
    const question = {
      parentPrn: strongPrn,
      victimPrn,
      parentDopplerHz: dopplerHz,
      parentCn0DbHz: cn0DbHz,
      coherentMs,
      sums,
      dopplerHalfWidthHz: windowHz,
    };
    worker.current?.postMessage({ run: newest.current.run, question } satisfies FalseLockRequest);
  }, [inputs]);
  return answer;
}
