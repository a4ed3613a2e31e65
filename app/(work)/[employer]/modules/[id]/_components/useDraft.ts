"use client";
import { useCallback, useEffect, useRef, useState } from "react";
import type { DraftReading } from "@/lib/queries/checkDraft";

export type DraftSaved = { state: "saved" | "saving" | "kept" | "not-saved"; at: string | null; why: string | null };

type Options = {
  base: string;
  source: string;
  title: string;
  revision: number;
  savedAt: string;
  reading: DraftReading;
};

const SAVE_MS = 1200;
const CHECK_MS = 350;
const AGAIN_MS = 4000;
const clock = (iso: string) => new Date(iso).toTimeString().slice(0, 8);

/** The text of a draft: checked a moment after each change, stored a moment later, never over somebody else's newer text. */
export function useDraft(options: Options) {
  const { base } = options;
  const [source, setSource] = useState(options.source);
  const [reading, setReading] = useState(options.reading);
  const [checking, setChecking] = useState(false);
  const [saved, setSaved] = useState<DraftSaved>({ state: "saved", at: clock(options.savedAt), why: null });
  const state = useRef({ source, title: options.title, revision: options.revision, stored: options.source });
  const timers = useRef<{ save?: ReturnType<typeof setTimeout>; check?: ReturnType<typeof setTimeout> }>({});
  const checkRun = useRef(0);
  const saveRef = useRef<() => Promise<unknown>>(async () => undefined);
  const underWay = useRef<Promise<void> | null>(null);

  const storeOnce = useCallback(async () => {
    const { source: text, title, revision: seen, stored } = state.current;
    if (text === stored) return;
    setSaved((before) => ({ ...before, state: "saving" }));
    try {
      const response = await send(`${base}/draft`, "PUT", { source: text, title, revision: seen });
      const body = (await response.json()) as { revision?: number; savedAt?: string; message?: string };
      if (!response.ok) {
        setSaved((before) => ({ ...before, state: "not-saved", why: body.message ?? "The server refused it." }));
        return;
      }
      state.current.revision = body.revision!;
      state.current.stored = text;
      setSaved({ state: "saved", at: clock(body.savedAt!), why: null });
      if (state.current.source !== text) timers.current.save = setTimeout(() => void saveRef.current(), SAVE_MS);
    } catch {
      setSaved((before) => ({ ...before, state: "kept", why: "No signal. Keep this page open; it sends by itself." }));
      timers.current.save = setTimeout(() => void saveRef.current(), AGAIN_MS);
    }
  }, [base]);

  /** Store what stands in the editor. The revision that holds it, or null when it could not be stored. */
  const save = useCallback(async (): Promise<number | null> => {
    // One at a time: a second save with the revision of the first would be refused as somebody else's.
    while (underWay.current) await underWay.current;
    underWay.current = storeOnce().finally(() => {
      underWay.current = null;
    });
    await underWay.current;
    return state.current.stored === state.current.source ? state.current.revision : null;
  }, [storeOnce]);

  const check = useCallback(async () => {
    checkRun.current += 1;
    const run = checkRun.current;
    setChecking(true);
    try {
      const response = await send(`${base}/check`, "POST", { source: state.current.source });
      if (!response.ok || run !== checkRun.current) return;
      const next = (await response.json()) as DraftReading;
      if (next.title) state.current.title = next.title;
      // A text with an error has no plan of checks; the cards of the last good one stay.
      setReading((before) => (next.title === null ? { ...next, checkCards: before.checkCards } : next));
    } catch {
      // Without a signal the last reading stays; saving says that there is none.
    } finally {
      if (run === checkRun.current) setChecking(false);
    }
  }, [base]);

  useEffect(() => {
    saveRef.current = save;
    const held = timers.current;
    return () => {
      clearTimeout(held.save);
      clearTimeout(held.check);
    };
  }, [save]);

  const change = useCallback(
    (text: string) => {
      state.current.source = text;
      setSource(text);
      const now = text === state.current.stored ? "saved" : "saving";
      setSaved((before) => (before.state === now ? before : { ...before, state: now }));
      clearTimeout(timers.current.save);
      clearTimeout(timers.current.check);
      timers.current.save = setTimeout(() => void saveRef.current(), SAVE_MS);
      timers.current.check = setTimeout(() => void check(), CHECK_MS);
    },
    [check],
  );
  return { source, reading, checking, saved, change, save };
}

const send = (address: string, method: "PUT" | "POST", body: object) =>
  fetch(address, { method, headers: { "content-type": "application/json" }, body: JSON.stringify(body) });
