import { UsageError } from "./UsageError";

/** A number of the command line within its bounds. */
export function readNumber(
  flag: string,
  text: string | undefined,
  fallback: number,
  lowest: number,
  highest: number,
): number {
  if (text === undefined) return fallback;
  const value = /^-?\d+(\.\d+)?(e-?\d+)?$/i.test(text) ? Number(text) : NaN;
  if (!(value >= lowest && value <= highest))
    throw new UsageError(`--${flag} is a number from ${lowest} to ${highest}, not ${text}`);
  return value;
}

/** Whole numbers and stretches of them: `1-32,40`. */
export function readNumberList(flag: string, text: string): number[] {
  const numbers = text.split(",").flatMap((part) => {
    const found = /^(\d{1,3})(?:-(\d{1,3}))?$/.exec(part.trim());
    if (!found) throw new UsageError(`--${flag} is a list such as 1-32,40, not ${text}`);
    const from = Number(found[1]);
    return Array.from({ length: Math.max(0, Number(found[2] ?? from) - from + 1) }, (_, n) => from + n);
  });
  return [...new Set(numbers)];
}
