"use client";
import { useRef, useState, type KeyboardEvent, type PointerEvent } from "react";
import { rowPeaks } from "./peaks";

export type LineCursor = {
  /** Index into the points; controlled when given. */
  index?: number;
  onMove?: (index: number) => void;
  /** Enter, or the Take key of the page. */
  onTake?: (index: number) => void;
};

type Drawn = { x: ArrayLike<number>; y: ArrayLike<number>; toPx: (value: number) => number };

/** Cursor over a row of points: keys, mouse (jumps to the pointer) and touch (moves by as much as the finger). */
export function useLineCursor(cursor: LineCursor | undefined, { x, y, toPx }: Drawn) {
  const count = Math.min(x.length, y.length);
  const [own, setOwn] = useState(() => cursor?.index ?? Math.max(0, rowPeaks(y)[0] ?? 0));
  const index = Math.min(Math.max(0, cursor?.index ?? own), Math.max(0, count - 1));
  const drag = useRef<{ px: number; from: number } | null>(null);

  const move = (to: number) => {
    const next = Math.min(Math.max(0, to), count - 1);
    setOwn(next);
    cursor?.onMove?.(next);
  };
  const nearest = (px: number) => nearestIndex(x, count, px, toPx);

  const nextPeak = () => {
    const peaks = rowPeaks(y).slice(0, MOST_PEAKS);
    move(peaks[(peaks.indexOf(index) + 1) % peaks.length] ?? index);
  };
  const onKey = (event: KeyboardEvent): boolean => {
    if (event.key === "p" || event.key === "P") {
      nextPeak();
      return true;
    }
    const target = nextIndex(event, index, count);
    if (target !== null) move(target);
    else if (event.key === "Enter" && cursor?.onTake) cursor.onTake(index);
    else return false;
    return true;
  };
  const onPointer = (event: PointerEvent<HTMLDivElement>) => {
    const px = event.clientX - event.currentTarget.getBoundingClientRect().left;
    if (event.type === "pointerdown") {
      if (event.button > 0) return;
      event.currentTarget.setPointerCapture?.(event.pointerId);
      if (event.pointerType !== "touch") move(nearest(px));
      drag.current = { px, from: event.pointerType === "touch" ? toPx(x[index]) : px };
    } else if (event.type === "pointermove" && drag.current) {
      move(nearest(drag.current.from + px - drag.current.px));
    } else if (drag.current) {
      const tapped = event.type === "pointerup" && Math.abs(px - drag.current.px) < 4;
      if (tapped) move(nearest(px));
      drag.current = null;
    }
  };
  return { index, nudge: (across: number) => move(index + across), nextPeak, onKey, onPointer };
}

const MOST_PEAKS = 12; // that P visits by their strength before it begins anew

/** Arrows one point, Shift ten, Home and End. Null for any other key. */
function nextIndex(event: KeyboardEvent, index: number, count: number): number | null {
  const step = event.shiftKey ? 10 : 1;
  switch (event.key) {
    case "ArrowRight":
      return index + step;
    case "ArrowLeft":
      return index - step;
    case "Home":
      return 0;
    case "End":
      return count - 1;
    default:
      return null;
  }
}

function nearestIndex(x: ArrayLike<number>, count: number, px: number, toPx: (value: number) => number): number {
  let best = 0;
  for (let at = 1; at < count; at++) if (Math.abs(toPx(x[at]) - px) < Math.abs(toPx(x[best]) - px)) best = at;
  return best;
}
