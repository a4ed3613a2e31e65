import { formatUnit } from "@/lib/checks/formatQuantity";
import { parseQuantity } from "@/lib/checks/parseQuantity";
import type { Unit } from "@/lib/gnss/units";
import type { Bounded, InputValue } from "./calculator";
import { shownFigure } from "./inputText";

export type ReadInput<V = InputValue> = { value: V } | { problem: string };

/** One figure, bare or with a unit of its own. */
export function readFigure(bounds: Bounded, unit: Unit, text: string): ReadInput<number | null> {
  if (text.trim() === "")
    return bounds.absent === undefined
      ? { problem: `Give a number from ${rangeText(bounds, unit)}.` }
      : { value: null };
  const read = parseQuantity(text, unit);
  if ("problem" in read) return read;
  const { value } = read;
  if (!(value >= bounds.from && value <= bounds.to))
    return { problem: withReason(`The range is ${rangeText(bounds, unit)}.`, bounds) };
  if (bounds.whole && !Number.isInteger(value))
    return { problem: withReason(`Give a whole number from ${rangeText(bounds, unit)}.`, bounds) };
  return { value };
}

const withReason = (rule: string, { why }: Bounded) => (why ? `${rule} ${why}` : rule);

/** "20 to 55 dB-Hz". */
export function rangeText(bounds: Bounded, unit: Unit): string {
  const name = formatUnit(unit);
  return `${unbroken(bounds, bounds.from)} to ${unbroken(bounds, bounds.to)}${name === "" ? "" : `\u00a0${name}`}`;
}

/** No more figures than the bound has; a line may not end at the thin space between thousands. */
const unbroken = (bounds: Bounded, value: number) =>
  shownFigure({ ...bounds, decimals: 0 }, value).replaceAll("\u2009", "\u2060\u2009\u2060");
