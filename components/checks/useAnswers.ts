"use client";
import { useCallback, useEffect, useRef, useState } from "react";

export type Answers = Readonly<Record<string, string>>;
export type Saved = {
  state: "saved" | "saving" | "kept" | "not-saved";
  at: string | null;
  since: string | null;
  why: string | null;
};

type Kept = { answers: Answers; revision: number };
type Options = { caseId: string; address: string; server: Kept & { savedAt: string | null }; closed: boolean };

const WAIT_MS = 700;
const AGAIN_MS = 4000;
const clock = (at: Date) => at.toTimeString().slice(0, 8);

/**
 * Answers of an open case: on this device with every key, at the server a moment later. Without a signal they stay on the
 * device and send themselves; after a reload the newer of the two is shown.
 */
export function useAnswers({ caseId, address, server, closed }: Options) {
  const storageKey = `lagmark.case.${caseId}`;
  const [current, setCurrent] = useState<Kept>(server);
  const [saved, setSaved] = useState<Saved>({
    state: "saved",
    at: server.savedAt && clock(new Date(server.savedAt)),
    since: null,
    why: null,
  });
  const latest = useRef<Kept>(server);
  const sent = useRef(server.revision);
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null);
  const sendRef = useRef<() => Promise<void>>(async () => undefined);
  const underWay = useRef(false);

  const send = useCallback(async () => {
    const { answers, revision } = latest.current;
    // What is typed meanwhile is sent when the answer to this one is there.
    if (closed || revision <= sent.current || underWay.current) return;
    underWay.current = true;
    setSaved((before) => ({ ...before, state: before.state === "kept" ? "kept" : "saving" }));
    try {
      const response = await fetch(address, {
        method: "PUT",
        headers: { "content-type": "application/json" },
        body: JSON.stringify({ answers, revision }),
      });
      if (response.status >= 500) throw new Error(String(response.status));
      const body = (await response.json()) as { savedAt?: string; message?: string };
      if (!response.ok) {
        setSaved((before) => ({ ...before, state: "not-saved", why: body.message ?? "The server refused it." }));
        return;
      }
      sent.current = Math.max(sent.current, revision);
      setSaved({ state: "saved", at: clock(new Date(body.savedAt!)), since: null, why: null });
      if (latest.current.revision > sent.current) schedule(WAIT_MS);
    } catch {
      setSaved((before) => ({ ...before, state: "kept", since: before.since ?? clock(new Date()) }));
      schedule(AGAIN_MS);
    } finally {
      underWay.current = false;
    }
    function schedule(ms: number) {
      if (timer.current) clearTimeout(timer.current);
      timer.current = setTimeout(() => void sendRef.current(), ms);
    }
  }, [address, closed]);

  useEffect(() => {
    sendRef.current = send;
  }, [send]);

  // What this device kept is read once the page is alive: the server cannot know it.
  useEffect(() => {
    const kept = readKept(storageKey);
    if (kept && kept.revision > latest.current.revision) {
      latest.current = kept;
      queueMicrotask(() => {
        setCurrent(kept);
        void sendRef.current();
      });
    }
    const online = () => void sendRef.current();
    addEventListener("online", online);
    return () => {
      removeEventListener("online", online);
      if (timer.current) clearTimeout(timer.current);
    };
  }, [storageKey]);

  const change = useCallback(
    (fields: Answers) => {
      const next = { answers: { ...latest.current.answers, ...fields }, revision: latest.current.revision + 1 };
      latest.current = next;
      setCurrent(next);
      try {
        localStorage.setItem(storageKey, JSON.stringify(next));
      } catch {
        setSaved((before) => ({ ...before, why: "This device is full; answers are only at the server." }));
      }
      if (timer.current) clearTimeout(timer.current);
      timer.current = setTimeout(() => void sendRef.current(), WAIT_MS);
    },
    [storageKey],
  );
  const forget = useCallback(() => localStorage.removeItem(storageKey), [storageKey]);
  return { answers: current.answers, saved, change, send, forget };
}

function readKept(key: string): Kept | null {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(key) ?? "null");
    if (typeof kept !== "object" || kept === null || !("answers" in kept) || !("revision" in kept)) return null;
    return typeof kept.revision === "number" ? (kept as Kept) : null;
  } catch {
    return null;
  }
}
