"use client";
import { useState } from "react";
import { NumberField } from "@/components/ui/NumberField";
import type { Bounded } from "@/lib/calculators/calculator";
import { shownFigure } from "@/lib/calculators/inputText";
import { rangeText, readFigure } from "@/lib/calculators/readFigure";
import { unitText } from "@/lib/calculators/unitText";
import type { Unit } from "@/lib/gnss/units";

type FigureFieldProps = {
  label: string;
  bounds: Bounded;
  unit?: Unit;
  value: number | null;
  onChange: (value: number | null) => void;
  className?: string;
};

/** A figure of a calculator: read when it is left, refused with range and reason, and the last good value stays in force. */
export function FigureField({ label, bounds, unit = "1", value, onChange, className }: FigureFieldProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const [error, setError] = useState<string | null>(null);

  const leave = (text: string) => {
    if (typed === null) return;
    const read = readFigure(bounds, unit, text);
    if ("problem" in read) return setError(read.problem);
    setError(null);
    setTyped(null);
    if (read.value !== value) onChange(read.value);
  };
  const range = rangeText(bounds, unit);
  return (
    <NumberField
      label={label}
      unit={unitText(unit)}
      help={bounds.absent ? `${range}; empty: ${bounds.absent}` : range}
      error={error}
      signed={bounds.signed}
      value={typed ?? (value === null ? "" : shownFigure(bounds, value))}
      onChange={(text) => {
        setTyped(text);
        setError(null);
      }}
      onLeave={leave}
      onKeyDown={(event) => {
        if (event.key === "Enter") leave(event.currentTarget.value);
      }}
      className={className}
    />
  );
}
