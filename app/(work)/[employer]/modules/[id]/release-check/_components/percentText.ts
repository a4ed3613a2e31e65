/** A rate in per cent with two figures behind the point where it is near 0 or 100, one elsewhere. */
export function percentText(rate: number): string {
  const percent = 100 * rate;
  const decimals = percent === 0 || percent === 100 ? 0 : percent < 2 || percent > 98 ? 2 : 1;
  return `${percent.toFixed(decimals)}\u00a0%`;
}
