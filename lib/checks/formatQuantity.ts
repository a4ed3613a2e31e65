import type { Unit } from "@/lib/gnss/units";

/** Text of a quantity with a true minus, thin spaces between thousands and a space that does not break before the unit. */
export function formatQuantity(value: number, unit: Unit, decimals: number): string {
  const name = formatUnit(unit);
  return name === "" ? formatNumber(value, decimals) : `${formatNumber(value, decimals)}\u00a0${name}`;
}

const PRINTED: Partial<Record<Unit, string>> = {
  "1": "",
  us: "µs",
  sigma: "σ",
  sigma2: "σ²",
  deg: "°",
  "dB/100m": "dB/100 m",
  ohm: "Ω",
  "ohm/km": "Ω/km",
};

/** Unit as printed: µs for us, nothing for a plain number. */
export const formatUnit = (unit: Unit): string => PRINTED[unit] ?? unit;

/** @param decimals 0 to 15, as many as the reader can use */
export function formatNumber(value: number, decimals: number): string {
  const [whole, rest] = Math.abs(value).toFixed(decimals).split(".");
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, "\u2009");
  const digits = rest === undefined ? grouped : `${grouped}.${rest}`;
  return value < 0 && /[1-9]/.test(digits) ? `\u2212${digits}` : digits;
}
