"use client";
import { useRef, type KeyboardEvent, type PointerEvent } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import { axisTicks } from "./ticks";
import { MIN_GAP_X_PX } from "./geometry";
import { useWidth } from "./useWidth";

type AxisSliderProps = {
  label: string;
  unit?: string;
  from: number;
  to: number;
  step: number;
  value: number;
  onChange: (value: number) => void;
  decimals?: number;
  signed?: boolean;
  /** The same as those of the plot above, so that both scales agree. */
  margins?: { left: number; right: number };
  marks?: readonly { at: number; name: string }[];
};

const LINE_Y = 16;

/** A slider that is the axis of the plot above it. Arrow one step, Shift ten, Page fifty, Home and End. */
export function AxisSlider({
  label,
  unit,
  from,
  to,
  step,
  value,
  onChange,
  decimals = 0,
  signed,
  margins = { left: 12, right: 12 },
  marks = [],
}: AxisSliderProps) {
  const [box, width] = useWidth<HTMLDivElement>(640);
  const thumb = useRef<HTMLDivElement>(null);
  const length = Math.max(1, width - margins.left - margins.right);
  const toPx = (at: number) => margins.left + ((at - from) / (to - from)) * length;
  const ticks = axisTicks(from, to, length, MIN_GAP_X_PX);

  // A name stands at the right of its mark, at the left only where it would leave the drawing.
  const leansLeft = (mark: { at: number; name: string }) => toPx(mark.at) + mark.name.length * 7.5 > width;

  const set = (wanted: number) => {
    const stepped = from + Math.round((wanted - from) / step) * step;
    const next = Number(Math.min(to, Math.max(from, stepped)).toPrecision(12));
    if (next !== value) onChange(next);
  };
  const onKey = (event: KeyboardEvent) => {
    const target = targetOf(event, { value, from, to, step });
    if (target === null) return;
    event.preventDefault();
    set(target);
  };
  const onPointer = (event: PointerEvent<HTMLDivElement>) => {
    if (event.type === "pointerdown") {
      event.currentTarget.setPointerCapture?.(event.pointerId);
      thumb.current?.focus();
    } else if (event.buttons === 0) return;
    const px = event.clientX - event.currentTarget.getBoundingClientRect().left;
    set(from + ((px - margins.left) / length) * (to - from));
  };
  return (
    <div ref={box} className="axis-slider" onPointerDown={onPointer} onPointerMove={onPointer}>
      <svg width={width} height="58" className="plot-svg" aria-hidden>
        <rect
          x={margins.left}
          y={LINE_Y - 5}
          width={Math.max(0, toPx(value) - margins.left)}
          height="5"
          fill="var(--plus)"
        />
        <path
          d={`M${margins.left} ${LINE_Y}H${width - margins.right}${ticks.major.map((at) => `M${toPx(at)} ${LINE_Y}v8`).join("")}${ticks.minor.map((at) => `M${toPx(at)} ${LINE_Y}v4`).join("")}`}
          className="plot-axis"
        />
        {ticks.major.map((at) => (
          <text key={at} x={toPx(at)} y={LINE_Y + 34} textAnchor="middle" className="plot-tick">
            {formatNumber(at, ticks.decimals, signed)}
          </text>
        ))}
        {marks.map((mark) => (
          <g key={mark.name}>
            <path d={`M${toPx(mark.at)} 0V${LINE_Y}`} stroke="var(--minus-deep)" strokeWidth="1.5" />
            <text
              x={toPx(mark.at) + (leansLeft(mark) ? -5 : 5)}
              y="9"
              textAnchor={leansLeft(mark) ? "end" : "start"}
              className="plot-curve-name"
              fill="var(--minus-deep)"
            >
              {mark.name}
            </text>
          </g>
        ))}
      </svg>
      <div
        ref={thumb}
        className="axis-thumb"
        style={{ left: toPx(value) }}
        role="slider"
        tabIndex={0}
        aria-label={unit ? `${label}, ${unit}` : label}
        aria-valuemin={from}
        aria-valuemax={to}
        aria-valuenow={value}
        aria-valuetext={`${formatNumber(value, decimals, signed)}${unit ? ` ${unit}` : ""}`}
        onKeyDown={onKey}
      />
    </div>
  );
}

type Range = { value: number; from: number; to: number; step: number };

function targetOf(event: KeyboardEvent, { value, from, to, step }: Range): number | null {
  const by = event.shiftKey ? 10 * step : step;
  switch (event.key) {
    case "ArrowRight":
    case "ArrowUp":
      return value + by;
    case "ArrowLeft":
    case "ArrowDown":
      return value - by;
    case "PageUp":
      return value + 50 * step;
    case "PageDown":
      return value - 50 * step;
    case "Home":
      return from;
    case "End":
      return to;
    default:
      return null;
  }
}
