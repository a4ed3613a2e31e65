import { InvalidError } from "@/lib/errors";
import { textWidth } from "./textWidth";

/** Shares of the largest size: below the first a name reads better on two lines, which take up to the second. */
const ONE_LINE = 0.57;
const TWO_LINES = 0.61;
const SMALLEST_PT = 8;

/** Size and lines of the holder's name, the largest that the width holds; call loadPdfFonts first. */
export function fitName(name: string, widthPt: number, largestPt: number): { sizePt: number; lines: string[] } {
  const oneLine = sizeFor([name], widthPt, largestPt);
  const lines = oneLine >= ONE_LINE * largestPt ? [name] : splitName(name);
  const sizePt = lines.length === 1 ? oneLine : sizeFor(lines, widthPt, TWO_LINES * largestPt);
  if (sizePt < SMALLEST_PT) throw new InvalidError("The holder's name is too long for a certificate.");
  return { sizePt, lines };
}

const sizeFor = (lines: string[], widthPt: number, largestPt: number): number =>
  Math.min(largestPt, Math.floor((2 * widthPt) / widestOf(lines)) / 2);

/** Two lines broken at the space that leaves the longer of them shortest. */
function splitName(name: string): string[] {
  const words = name.split(" ");
  let best = { lines: [name], width: Infinity };
  for (let first = 1; first < words.length; first += 1) {
    const lines = [words.slice(0, first).join(" "), words.slice(first).join(" ")];
    const width = widestOf(lines);
    if (width < best.width) best = { lines, width };
  }
  return best.lines;
}

const widestOf = (lines: string[]): number => Math.max(...lines.map((line) => textWidth(line, 700, 1)));
