const MINUS = "\u2212";
const THIN = "\u2009";

/**
 * A figure as it stands on a screen or on paper: true minus, thin space between thousands, decimal point.
 * @param decimals figures after the point, 0 or more
 * @param signed also shows a plus (Doppler, differences); zero has no sign
 */
export function formatNumber(value: number, decimals = 0, signed = false): string {
  if (!Number.isFinite(value)) return "–";
  const [whole, fraction] = Math.abs(value).toFixed(decimals).split(".");
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, THIN);
  const digits = fraction ? `${grouped}.${fraction}` : grouped;
  const zero = !/[1-9]/.test(digits);
  const sign = zero ? "" : value < 0 ? MINUS : signed ? "+" : "";
  return sign + digits;
}
