import { InvalidError } from "@/lib/errors";
import { textWidth } from "./textWidth";

const LARGEST_PT = 44;
/** Below this a name reads better on two lines. */
const ONE_LINE_PT = 25;
const TWO_LINES_PT = 27;
const SMALLEST_PT = 8;

/** Size and lines of the holder's name, the largest that the width holds; call loadPdfFonts first. */
export function fitName(name: string, widthPt: number): { sizePt: number; lines: string[] } {
  const oneLine = sizeFor([name], widthPt, LARGEST_PT);
  const split = splitName(name);
  const lines = oneLine >= ONE_LINE_PT ? [name] : split;
  const sizePt = lines.length === 1 ? oneLine : sizeFor(lines, widthPt, TWO_LINES_PT);
  if (sizePt < SMALLEST_PT) throw new InvalidError("The holder's name is too long for a certificate.");
  return { sizePt, lines };
}

function sizeFor(lines: string[], widthPt: number, largestPt: number): number {
  const widest = Math.max(...lines.map((line) => textWidth(line, 700, 1)));
  return Math.min(largestPt, Math.floor((2 * widthPt) / widest) / 2);
}

/** Two lines broken at the space that leaves the longer of them shortest. */
function splitName(name: string): string[] {
  const words = name.split(" ");
  const splits = words
    .slice(1)
    .map((_, index) => [words.slice(0, index + 1).join(" "), words.slice(index + 1).join(" ")]);
  const longest = (lines: string[]) => Math.max(...lines.map((line) => textWidth(line, 700, 1)));
  return splits.sort((a, b) => longest(a) - longest(b))[0] ?? [name];
}
