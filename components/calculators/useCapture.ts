"use client";
import { useEffect, useState } from "react";

export type CaptureLoad =
  | { state: "loading"; doneBytes: number; totalBytes: number }
  | { state: "ready"; samples: Int8Array }
  | { state: "failed" };

/** Fetch the samples of a capture, telling how far it has come. A new `again` fetches anew. */
export function useCapture(address: string, again: number): CaptureLoad {
  const [load, setLoad] = useState<CaptureLoad>({ state: "loading", doneBytes: 0, totalBytes: 0 });
  useEffect(() => {
    const stop = new AbortController();
    fetchBytes(address, stop.signal, (doneBytes, totalBytes) => setLoad({ state: "loading", doneBytes, totalBytes }))
      .then((bytes) => setLoad({ state: "ready", samples: new Int8Array(bytes.buffer) }))
      .catch(() => {
        if (!stop.signal.aborted) setLoad({ state: "failed" });
      });
    return () => stop.abort();
  }, [address, again]);
  return load;
}

async function fetchBytes(address: string, signal: AbortSignal, onProgress: (done: number, total: number) => void) {
  const response = await fetch(address, { signal });
  if (!response.ok || !response.body) throw new Error(`capture: ${response.status}`);
  const total = Number(response.headers.get("content-length") ?? 0);
  const parts: Uint8Array[] = [];
  let done = 0;
  const reader = response.body.getReader();
  for (let read = await reader.read(); !read.done; read = await reader.read()) {
    parts.push(read.value);
    done += read.value.length;
    onProgress(done, total);
  }
  const bytes = new Uint8Array(done);
  let at = 0;
  for (const part of parts) {
    bytes.set(part, at);
    at += part.length;
  }
  return bytes;
}
