"use client";
import { Key } from "@/components/ui/Key";

const ACROSS = [
  { word: "left", across: -1, up: 0, path: "M14 4v16L4 12z" },
  { word: "right", across: 1, up: 0, path: "M10 4v16l10-8z" },
];
const UP = [
  { word: "up", across: 0, up: 1, path: "M4 15h16L12 5z" },
  { word: "down", across: 0, up: -1, path: "M4 9h16l-8 10z" },
];

type NudgeKeysProps = {
  /** The plot they belong to: a page can have several. */
  label: string;
  /** A line's cursor goes along it, a grid's crosshair in two directions. */
  cursor: "line" | "both";
  onNudge: (across: number, up: number) => void;
  onNextPeak?: () => void;
};

/** Keys for gloves: one step at a time, and the next peak. */
export function NudgeKeys({ label, cursor, onNudge, onNextPeak }: NudgeKeysProps) {
  const step = cursor === "line" ? "One step" : "One cell";
  return (
    <div className="nudge-keys no-print" role="group" aria-label={label} data-cursor={cursor}>
      {(cursor === "line" ? ACROSS : [...ACROSS, ...UP]).map(({ word, across, up, path }) => (
        <Key key={word} size="large" aria-label={`${step} ${word}`} onClick={() => onNudge(across, up)}>
          <svg width="24" height="24" viewBox="0 0 24 24" aria-hidden>
            <path d={path} fill="currentColor" />
          </svg>
        </Key>
      ))}
      {onNextPeak && (
        <Key size="large" onClick={onNextPeak}>
          Next peak
        </Key>
      )}
    </div>
  );
}
