"use client";
import { useEffect, useState, useSyncExternalStore } from "react";
import { CaptureReader } from "./CaptureReader";

type Typed = { format: string; rateHz: number; carrierHz: number };
type StretchMs = { fromMs: number; lengthMs: number | null };

/** A recording under the settings that now stand in the fields: when one of them changes, what depends on it is done anew. */
export function useCaptureFile({ format, rateHz, carrierHz }: Typed, { fromMs, lengthMs }: StretchMs) {
  const [reader] = useState(() => new CaptureReader());
  const state = useSyncExternalStore(
    reader.subscribe,
    () => reader.state,
    () => reader.state,
  );
  useEffect(() => () => reader.end(), [reader]);
  useEffect(() => {
    reader.draw({ fromS: fromMs / 1000, lengthS: lengthMs === null ? null : lengthMs / 1000 });
  }, [reader, fromMs, lengthMs]);
  useEffect(() => reader.readAs({ format, rateHz, carrierHz }), [reader, format, rateHz, carrierHz]);
  return { reader, ...state };
}
