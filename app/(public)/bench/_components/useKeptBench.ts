import { useEffect } from "react";
import { filesOfWorkers } from "@/components/calculators/startWorkers";

const SETTLED_MS = 1500; // scripts that the open calculator asks for have come by then
const SCRIPT = "/bench-worker.js";

/**
 * Lets the browser keep the bench for use without a network: the service worker is told which scripts this page is made of,
 * and names what it keeps after them. Where service workers are not to be had, nothing happens.
 */
export function useKeptBench(): void {
  useEffect(() => {
    if (process.env.NODE_ENV !== "production" || !("serviceWorker" in navigator)) return;
    const timer = setTimeout(() => void keepBench(), SETTLED_MS);
    return () => clearTimeout(timer);
  }, []);
}

async function keepBench(): Promise<void> {
  try {
    await navigator.serviceWorker.register(SCRIPT, { scope: "/bench" });
    // A calculator's own worker is answered by its own address, not by that of the page that starts it.
    await navigator.serviceWorker.register(SCRIPT, { scope: STATIC });
    const { active } = await navigator.serviceWorker.ready;
    await idle();
    await Promise.allSettled(fontsOfFormulas().map((font) => font.load()));
    const files = [...new Set([...loadedFiles(), ...(await filesOfWorkers())])];
    active?.postMessage({ kind: "keep", version: versionOf(builtFiles()), files });
  } catch {
    // Private windows and some settings forbid it: the bench then needs its network.
  }
}

const STATIC = "/_next/static/";

const idle = () =>
  new Promise<unknown>((resolve) =>
    "requestIdleCallback" in window ? requestIdleCallback(resolve, { timeout: 10_000 }) : setTimeout(resolve, 0),
  );

/** Of all calculators, whichever are open: a formula asks for its fonts when it is seen. */
const fontsOfFormulas = () => [...document.fonts].filter(({ family }) => /KaTeX_(Main|Math|AMS|Size)/.test(family));

/** Scripts, styles and fonts that have come so far. */
function loadedFiles(): string[] {
  const paths = performance.getEntriesByType("resource").map(({ name }) => new URL(name).pathname);
  return [...new Set([...paths, ...builtFiles()])].filter((path) => path.startsWith(STATIC));
}

/** What the page itself names. It is the same at every visit of one build, whatever was opened. */
function builtFiles(): string[] {
  const elements = document.querySelectorAll<HTMLScriptElement | HTMLLinkElement>("script[src], link[href]");
  const paths = Array.from(elements, (one) => new URL("src" in one ? one.src : one.href).pathname);
  return [...new Set(paths)].filter((path) => path.startsWith(STATIC) && /\.(js|css)$/.test(path)).sort();
}

/** FNV-1a, 32 bits, over the names. */
function versionOf(files: readonly string[]): string {
  let hash = 0x811c9dc5;
  for (const letter of files.join("\n")) hash = Math.imul(hash ^ letter.charCodeAt(0), 0x01000193);
  return (hash >>> 0).toString(16).padStart(8, "0");
}
