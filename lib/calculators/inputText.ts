import { formatNumber } from "@/lib/checks/formatQuantity";
import type { Bounded, CalculatorInput, InputValue, Row } from "./calculator";

/** An input's value as a link and a module carry it: plain letters, every figure kept. Empty for an empty input. */
export function inputText(input: CalculatorInput, value: InputValue): string {
  if (input.input === "rows") return (value as readonly Row[]).map(rowText).join("; ");
  return value === null ? "" : String(value);
}

/** "cable: -9, 9, -": the figures in the order of the columns, a hyphen for an empty one. */
const rowText = ({ name, figures }: Row): string =>
  `${name}: ${figures.map((figure) => (figure === null ? "-" : String(figure))).join(", ")}`;

/** A figure as its field shows it: never fewer figures than were typed. */
export function shownFigure({ decimals, scientific, signed }: Bounded, value: number): string {
  if (scientific && value !== 0)
    return value.toExponential().replace("e-", "e\u2212").replace("e+", "e").replace(/^-/, "\u2212");
  const own = /\.(\d+)$/.exec(String(value))?.[1].length ?? 0;
  const text = formatNumber(value, Math.max(decimals, Math.min(own, 12)));
  return signed && value > 0 ? `+${text}` : text;
}
