/** A figure for a formula: thin spaces between thousands, powers of ten written out. */
export function texNumber(value: number, decimals = 0): string {
  if (!Number.isFinite(value)) return value < 0 ? String.raw`-\infty` : String.raw`\infty`;
  const size = Math.abs(value);
  if (size !== 0 && (size < 1e-4 || size >= 1e9)) {
    const [digits, power] = value.toExponential(2).split("e");
    return String.raw`${digits}\cdot 10^{${Number(power)}}`;
  }
  const [whole, fraction] = size.toFixed(decimals).split(".");
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, "\\,");
  const digits = fraction ? `${grouped}.${fraction}` : grouped;
  return value < 0 && /[1-9]/.test(digits) ? `-${digits}` : digits;
}

/** The same with its unit, upright. */
export const texQuantity = (value: number, unit: string, decimals = 0): string =>
  String.raw`${texNumber(value, decimals)}\,\mathrm{${unit}}`;
