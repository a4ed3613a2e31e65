"use client";
import { useSyncExternalStore } from "react";
import { TwoWay } from "./TwoWay";

const DARK = "(prefers-color-scheme: dark)";
const YEAR_S = 31_536_000;

/** Light or dark. Until somebody chooses, the device decides; the choice is kept in a cookie that the first answer reads. */
export function ThemeSwitch({ name = "theme" }: { name?: string }) {
  const theme = useSyncExternalStore(watch, shownTheme, () => null);
  return (
    <TwoWay
      name={name}
      label="Light or dark"
      value={theme}
      choices={[
        { value: "light", label: "Light" },
        { value: "dark", label: "Dark" },
      ]}
      onChange={choose}
    />
  );
}

const shownTheme = () => document.documentElement.dataset.theme ?? (window.matchMedia(DARK).matches ? "dark" : "light");

function choose(theme: string) {
  document.documentElement.dataset.theme = theme;
  document.cookie = `theme=${theme}; path=/; max-age=${YEAR_S}; samesite=lax`;
}

function watch(changed: () => void) {
  const system = window.matchMedia(DARK);
  const root = new MutationObserver(changed);
  root.observe(document.documentElement, { attributes: true, attributeFilter: ["data-theme"] });
  system.addEventListener("change", changed);
  return () => {
    root.disconnect();
    system.removeEventListener("change", changed);
  };
}
