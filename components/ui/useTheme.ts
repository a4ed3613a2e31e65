"use client";
import { useSyncExternalStore } from "react";

const DARK = "(prefers-color-scheme: dark)";

/** The theme now shown: what the person chose, else what the device asks for; null on the server. */
export const useTheme = (): "light" | "dark" | null => useSyncExternalStore(watch, shownTheme, () => null);

function shownTheme(): "light" | "dark" {
  const chosen = document.documentElement.dataset.theme;
  if (chosen === "light" || chosen === "dark") return chosen;
  return window.matchMedia?.(DARK).matches ? "dark" : "light";
}

function watch(changed: () => void) {
  const system = window.matchMedia?.(DARK);
  const root = new MutationObserver(changed);
  root.observe(document.documentElement, { attributes: true, attributeFilter: ["data-theme"] });
  system?.addEventListener("change", changed);
  return () => {
    root.disconnect();
    system?.removeEventListener("change", changed);
  };
}
