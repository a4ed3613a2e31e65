import { classNames } from "./classNames";
import { formatNumber } from "./formatNumber";

const sizes = { s: "text-readout-s", m: "text-readout", l: "text-readout-l", inline: "" };

type ValueProps = {
  /** A number is formatted; a text is shown as it is; null is an en dash and never zero. */
  value: number | string | null;
  unit?: string;
  decimals?: number;
  signed?: boolean;
  size?: keyof typeof sizes;
  className?: string;
};

/** A figure with its unit: the figure in ink, the unit smaller and quieter. */
export function Value({ value, unit, decimals = 0, signed = false, size = "inline", className }: ValueProps) {
  const empty = value === null || value === "";
  const text = empty ? "–" : typeof value === "number" ? formatNumber(value, decimals, signed) : value;
  return (
    <span className={classNames("value whitespace-nowrap", sizes[size], className)}>
      {text}
      {unit && !empty && <span className="text-[0.78em] font-normal text-ink-2">{` ${unit}`}</span>}
    </span>
  );
}
