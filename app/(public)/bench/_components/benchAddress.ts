import { useSyncExternalStore } from "react";

/*
 * The one state of the bench is its address: which calculator is open and, once one of them is changed, its inputs. The last
 * inputs of each calculator are kept on this device as the query that carries them.
 */

const WRITE_MS = 250; // a dragged cursor changes the inputs at every frame; browsers refuse so many addresses
const MEMORY = "lagmark.bench.";

const listeners = new Set<() => void>();
/** Newer than the address while a change waits to be written. */
let waiting: { id: string; query: string; timer: ReturnType<typeof setTimeout> } | null = null;

/** @param asked query that the server was asked for, which holds until the page runs */
export const useBenchQuery = (asked: string): string => useSyncExternalStore(subscribe, query, () => asked);

/** The last inputs on this device, as a query; null for a calculator that was never changed here. */
export const useRemembered = (id: string): string | null =>
  useSyncExternalStore(
    subscribe,
    () => remembered(id),
    () => null,
  );

/** @param id null for the list alone */
export const benchHref = (id: string | null): string => (id === null ? "/bench" : `/bench?open=${id}`);

/** Opens a calculator, or the list, without asking the server for the page again. */
export function goTo(id: string | null): void {
  write();
  history.pushState(null, "", benchHref(id));
  tell();
}

export function changeInputs(id: string, changed: string): void {
  if (waiting) clearTimeout(waiting.timer);
  waiting = { id, query: changed, timer: setTimeout(write, WRITE_MS) };
  tell();
}

/** Forgets the inputs of a calculator, here and in the address. */
export function forgetInputs(id: string): void {
  if (waiting) clearTimeout(waiting.timer);
  waiting = null;
  keep(id, null);
  history.replaceState(null, "", benchHref(id));
  tell();
}

const query = () => waiting?.query ?? location.search.slice(1);

function write(): void {
  if (!waiting) return;
  const { id, query: changed, timer } = waiting;
  clearTimeout(timer);
  keep(id, changed);
  history.replaceState(null, "", `/bench?${changed}`);
  waiting = null;
  tell();
}

function remembered(id: string): string | null {
  if (waiting?.id === id) return waiting.query;
  try {
    return localStorage.getItem(MEMORY + id);
  } catch {
    return null; // a browser may keep nothing; the bench works without
  }
}

function keep(id: string, changed: string | null): void {
  try {
    if (changed === null) localStorage.removeItem(MEMORY + id);
    else localStorage.setItem(MEMORY + id, changed);
  } catch {
    // Full, or forbidden: the address still carries the inputs.
  }
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  window.addEventListener("popstate", listener);
  window.addEventListener("pagehide", write);
  return () => {
    listeners.delete(listener);
    window.removeEventListener("popstate", listener);
    window.removeEventListener("pagehide", write);
  };
}

const tell = () => listeners.forEach((listener) => listener());
