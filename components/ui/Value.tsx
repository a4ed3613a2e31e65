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
  /** In a column of a table: the unit gets a place of fixed width, so that figures align whatever the unit. */
  slot?: boolean;
  className?: string;
};

/** A figure with its unit: the figure in ink, the unit smaller and quieter. */
export function Value({ value, unit, decimals = 0, signed = false, size = "inline", slot, className }: ValueProps) {
  const empty = value === null || value === "";
  const text = empty ? "–" : typeof value === "number" ? formatNumber(value, decimals, signed) : value;
  return (
    <span className={classNames("value whitespace-nowrap", sizes[size], className)}>
      {text}
      {unit && !empty && " "}
      {(slot || (unit && !empty)) && (
        <span
          className={classNames(
            "text-[0.78em] font-normal text-ink-2",
            slot && "ml-1 inline-block w-[2.6em] text-left",
          )}
        >
          {empty ? "" : unit}
        </span>
      )}
    </span>
  );
}
