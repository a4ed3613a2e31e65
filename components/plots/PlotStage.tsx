"use client";
import { useState, type KeyboardEvent, type PointerEvent, type ReactNode, type RefObject } from "react";
import { Key } from "@/components/ui/Key";
import { KeyCap } from "@/components/ui/KeyCap";
import { NudgeKeys } from "./NudgeKeys";
import { PlotTable, type TableColumn } from "./PlotTable";
import { useSpoken } from "./useSpoken";

type PlotStageProps = {
  box: RefObject<HTMLDivElement | null>;
  /** One sentence with the finding: the text alternative. */
  summary: string;
  /** What the cursor reads, in words; empty without a cursor. */
  reading: string;
  /** One direction or two, or no cursor at all. */
  cursor?: "line" | "both";
  /** Answers a key of the cursor; returns true when it was one. */
  onCursorKey?: (event: KeyboardEvent) => boolean;
  onPointer?: (event: PointerEvent<HTMLDivElement>) => void;
  /** The cursor by keys for fingers, where the plot is touched or the page is narrow. */
  onNudge?: (across: number, up: number) => void;
  onNextPeak?: () => void;
  table: { columns: readonly TableColumn[]; start?: number };
  /** Words of the hint line by key, in the order shown. */
  hints?: readonly { keys: readonly string[]; word: string }[];
  /** At the left of the hint line. */
  legend?: ReactNode;
  children: ReactNode;
};

/** A plot as one tab stop: spoken reading, keys of the cursor, T for the same data as a table. */
export function PlotStage({
  box,
  summary,
  reading,
  cursor,
  onCursorKey,
  onPointer,
  onNudge,
  onNextPeak,
  table,
  hints = [],
  legend,
  children,
}: PlotStageProps) {
  const [open, setOpen] = useState(false);
  const spoken = useSpoken(reading);
  const keyed = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    if (event.key.toLowerCase() === "t") setOpen(!open);
    else if (!onCursorKey?.(event)) return;
    event.preventDefault();
  };
  return (
    <figure className="plot">
      <div
        ref={box}
        className="plot-stage"
        data-cursor={cursor}
        role={cursor ? "application" : "img"}
        aria-roledescription={cursor ? "plot" : undefined}
        aria-label={cursor && reading ? `${summary} ${reading}` : summary}
        tabIndex={0}
        onKeyDown={keyed}
        onPointerDown={onPointer}
        onPointerMove={onPointer}
        onPointerUp={onPointer}
        onPointerCancel={onPointer}
      >
        {children}
      </div>
      <span className="sr-only" aria-live="polite">
        {spoken}
      </span>
      <div className="plot-hints no-print">
        {legend}
        <span className="ml-auto inline-flex flex-wrap items-center justify-end gap-x-4 gap-y-1">
          <span className="inline-flex flex-wrap gap-x-4 gap-y-1 max-tablet:hidden pointer-coarse:hidden">
            {hints.map((hint) => (
              <span key={hint.word} className="inline-flex items-center gap-1">
                {hint.keys.map((name) => (
                  <KeyCap key={name}>{name}</KeyCap>
                ))}
                {hint.word}
              </span>
            ))}
          </span>
          <Key size="tiny" onClick={() => setOpen(!open)} aria-expanded={open}>
            {open ? "Close the table" : "Values as a table"}
          </Key>
        </span>
      </div>
      {cursor && onNudge && <NudgeKeys label={summary} cursor={cursor} onNudge={onNudge} onNextPeak={onNextPeak} />}
      {open && <PlotTable caption={summary} {...table} />}
    </figure>
  );
}
