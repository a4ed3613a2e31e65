"use client";
import { useId } from "react";
import { TwoWay } from "./TwoWay";
import { useTheme } from "./useTheme";

const YEAR_S = 31_536_000;
const THEMES = [
  { value: "light", label: "Light" },
  { value: "dark", label: "Dark" },
];

/** Light or dark. Until somebody chooses, the device decides; the choice is kept in a cookie that the next answer reads. */
export function ThemeSwitch() {
  // A page may carry two of them (head and phone menu): radios of one name would be one group.
  const name = useId();
  return <TwoWay name={name} label="Light or dark" value={useTheme()} choices={THEMES} onChange={choose} />;
}

function choose(theme: string) {
  document.documentElement.dataset.theme = theme;
  document.cookie = `theme=${theme}; path=/; max-age=${YEAR_S}; samesite=lax`;
}
