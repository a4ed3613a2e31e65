"use client";
import { useCallback, useEffect, useRef, useState } from "react";
import type { GridOverview } from "@/components/plots/gridOverview";
import type { SearchRequest } from "@/lib/gnss/search/searchPlanOf";
import type { SearchMap } from "@/lib/gnss/search/searchMap";
import type { SkySearch } from "@/lib/gnss/search/searchSky";
import type { CaptureDescription, CaptureSource } from "./readCapture";
import type { CaptureAnswer, CaptureOrder, CaptureTask } from "./workers/capture.worker";

export type CaptureBusy = { step: "read" | "search"; done?: number; total?: number };
export type CaptureFileState = {
  busy: CaptureBusy | null;
  description: CaptureDescription | null;
  one: { map: SearchMap; overview: GridOverview; request: SearchRequest } | null;
  all: { sky: SkySearch; request: SearchRequest } | null;
  refused: string | null;
};

const NOTHING: CaptureFileState = { busy: null, description: null, one: null, all: null, refused: null };

/** A recording on this device and what is found in it, all of it computed off the page's own thread; one task at a time. */
export function useCaptureFile() {
  const worker = useRef<Worker | null>(null);
  const current = useRef({ job: 0, file: 0, source: null as CaptureSource | null });
  const [state, setState] = useState(NOTHING);

  const stop = useCallback(() => {
    worker.current?.terminate();
    worker.current = null;
    current.current.job += 1;
  }, []);
  useEffect(() => stop, [stop]);

  const order = (task: CaptureTask) => {
    const { source, file } = current.current;
    if (!source) return;
    if (state.busy) stop(); // what is under way is wanted no more
    worker.current ??= startWorker((answer) => {
      if (answer.job === current.current.job) setState((before) => stateAfter(before, answer));
    });
    const job = (current.current.job += 1);
    worker.current.postMessage({ job, file, source, task } satisfies CaptureOrder);
  };
  const open = (source: CaptureSource) => {
    current.current = { job: current.current.job, file: current.current.file + 1, source };
    setState({ ...NOTHING, busy: { step: "read" } });
    order({ kind: "open" });
  };
  const search = (task: CaptureTask) => {
    setState((before) => ({ ...before, busy: { step: "search" }, refused: null }));
    order(task);
  };
  const cancel = () => {
    stop();
    setState((before) => ({ ...before, busy: null }));
  };
  return { ...state, open, search, cancel };
}

function startWorker(take: (answer: CaptureAnswer) => void): Worker {
  const worker = new Worker(new URL("./workers/capture.worker.ts", import.meta.url), { type: "module" });
  worker.addEventListener("message", ({ data }: MessageEvent<CaptureAnswer>) => take(data));
  return worker;
}

function stateAfter(before: CaptureFileState, answer: CaptureAnswer): CaptureFileState {
  switch (answer.kind) {
    case "progress":
      return { ...before, busy: answer };
    case "opened":
      return { ...before, description: answer.description };
    case "one":
      return { ...before, one: answer };
    case "all":
      return { ...before, all: answer };
    case "done":
      return { ...before, busy: null };
    case "refused":
      return { ...before, busy: null, refused: answer.message };
  }
}
