/** Seconds as minutes and seconds, or hours, minutes and seconds from one hour on: 40:40, 1:05:00. */
export function clockText(seconds: number): string {
  const whole = Math.max(0, Math.round(seconds));
  const two = (count: number) => String(count).padStart(2, "0");
  const hours = Math.floor(whole / 3600);
  const minutes = Math.floor((whole % 3600) / 60);
  return hours ? `${hours}:${two(minutes)}:${two(whole % 60)}` : `${two(minutes)}:${two(whole % 60)}`;
}
