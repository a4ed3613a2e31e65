"use client";
import { useCallback, useEffect, useRef, useState } from "react";
import type { SearchSettings } from "@/lib/gnss/acquire";
import type { SearchAnswer, SearchedGrid, SearchRequest } from "./workers/search.worker";

export type SearchResult = { prn: number; settings: SearchSettings; grid: SearchedGrid };
export type SearchState = { busy: boolean; result: SearchResult | null; refused: string | null };

/** One satellite's grid at a time, computed off the page's own thread; a newer search leaves an older one's answer aside. */
export function useSearch(samples: Int8Array | null, rateHz: number) {
  const worker = useRef<Worker | null>(null);
  const run = useRef(0);
  const [state, setState] = useState<SearchState>({ busy: false, result: null, refused: null });

  useEffect(() => {
    if (!samples) return;
    const own = new Worker(new URL("./workers/search.worker.ts", import.meta.url), { type: "module" });
    worker.current = own;
    own.postMessage({ kind: "capture", samples, rateHz } satisfies SearchRequest);
    own.addEventListener("message", ({ data }: MessageEvent<SearchAnswer>) => {
      if (data.run !== run.current) return;
      if (data.kind === "refused") setState((before) => ({ ...before, busy: false, refused: data.message }));
      else
        setState({ busy: false, result: { prn: data.prn, settings: data.settings, grid: data.grid }, refused: null });
    });
    return () => {
      own.terminate();
      worker.current = null;
    };
  }, [samples, rateHz]);

  const search = useCallback((prn: number, settings: SearchSettings) => {
    if (!worker.current) return;
    run.current += 1;
    setState((before) => ({ ...before, busy: true, refused: null }));
    worker.current.postMessage({ kind: "search", run: run.current, prn, settings } satisfies SearchRequest);
  }, []);
  return { ...state, search };
}
