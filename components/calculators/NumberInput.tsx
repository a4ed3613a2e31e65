"use client";
import { useState } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import { NumberField } from "@/components/ui/NumberField";

type NumberInputProps = {
  label: string;
  unit?: string;
  value: number;
  onChange: (value: number) => void;
  from: number;
  to: number;
  decimals?: number;
  /** Takes whole numbers only. */
  whole?: boolean;
  signed?: boolean;
  /** Very small values read better as a power of ten. */
  scientific?: boolean;
  className?: string;
};

/** An input of a calculator: checked when it is left, refused with its range, and the last good value stays in force. */
export function NumberInput({
  label,
  unit,
  value,
  onChange,
  from,
  to,
  decimals = 0,
  whole,
  signed,
  scientific,
  className,
}: NumberInputProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const [error, setError] = useState<string | null>(null);
  const shown = (number: number) => (scientific ? powerOfTen(number) : formatNumber(number, decimals));
  const range = `${shown(from)} to ${shown(to)}${unit ? ` ${unit}` : ""}`;

  const leave = (text: string) => {
    const number = Number(
      text
        .trim()
        .replace(/[\u2212]/g, "-")
        .replace(/[\s\u2009]/g, "")
        .replace(",", "."),
    );
    if (text.trim() === "" || !Number.isFinite(number)) return setError(`Give a number from ${range}.`);
    if (number < from || number > to) return setError(`The range is ${range}.`);
    if (whole && !Number.isInteger(number)) return setError(`Give a whole number from ${range}.`);
    setError(null);
    setTyped(null);
    onChange(number);
  };
  return (
    <NumberField
      label={label}
      unit={unit}
      help={range}
      error={error}
      signed={signed}
      value={typed ?? shown(value)}
      onChange={(text) => {
        setTyped(text);
        if (!error) return;
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

const powerOfTen = (number: number) => number.toExponential().replace("e-", "e\u2212").replace("e+", "e");
