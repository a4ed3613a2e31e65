"use client";
import { useEffect, useRef, useState } from "react";
import type { Look, LookSettings } from "./lookAt";
import type { LookAnswer, LookRequest } from "./workers/look.worker";

/** A capture's spectra, computed off the page's own thread; null until the first is there, then the last one stays. */
export function useLook(samples: Int8Array | null, rateHz: number, settings: LookSettings): Look | null {
  const worker = useRef<Worker | null>(null);
  const run = useRef(0);
  const [look, setLook] = useState<Look | null>(null);
  const { points, stretchS } = settings;

  useEffect(() => {
    if (!samples) return;
    const own = new Worker(new URL("./workers/look.worker.ts", import.meta.url), { type: "module" });
    worker.current = own;
    own.postMessage({ kind: "capture", samples, rateHz } satisfies LookRequest);
    own.addEventListener("message", ({ data }: MessageEvent<LookAnswer>) => {
      if (data.run === run.current) setLook(data.look);
    });
    return () => {
      own.terminate();
      worker.current = null;
    };
  }, [samples, rateHz]);

  useEffect(() => {
    run.current += 1;
    const request: LookRequest = { kind: "look", run: run.current, settings: { points, stretchS } };
    worker.current?.postMessage(request);
  }, [samples, rateHz, points, stretchS]);
  return look;
}
