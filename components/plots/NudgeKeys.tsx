"use client";
import { Key } from "@/components/ui/Key";

const DIRECTIONS = [
  { word: "One cell left", across: -1, up: 0, path: "M14 4v16L4 12z" },
  { word: "One cell right", across: 1, up: 0, path: "M10 4v16l10-8z" },
  { word: "One cell up", across: 0, up: 1, path: "M4 15h16L12 5z" },
  { word: "One cell down", across: 0, up: -1, path: "M4 9h16l-8 10z" },
];

/** Keys for gloves: one cell at a time, and the next peak. */
export function NudgeKeys({
  onNudge,
  onNextPeak,
}: {
  onNudge: (across: number, up: number) => void;
  onNextPeak?: () => void;
}) {
  return (
    <div className="nudge-keys">
      {DIRECTIONS.map(({ word, across, up, path }) => (
        <Key key={word} size="large" aria-label={word} onClick={() => onNudge(across, up)}>
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
