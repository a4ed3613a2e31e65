import { FormatError } from "../FormatError";
import { readSentence, type Sentence } from "./readSentence";

/** Receivers write longer lines than the 82 characters of IEC 61162-1; beyond this it is no log of sentences. */
const LONGEST_LINE = 256;
/** A day of fifty sentences a second. */
const MOST_LINES = 4_320_000;

/** A sentence, or why a line is none. A bad line ends nothing: in a log of a day some are broken. */
export type NmeaLine = { sentence: Sentence } | { fault: FormatError };

/**
 * Reads a log piece by piece and keeps no more of it than one unfinished line. Empty lines are passed over, a line that is
 * too long is one fault, however long it is.
 * @throws FormatError past the most lines that a log may have
 */
export function nmeaReader(): { push(piece: Uint8Array): NmeaLine[]; end(): NmeaLine[] } {
  let kept = "";
  let line = 1;
  let tooLong = false;

  function finish(): NmeaLine[] {
    const text = kept.endsWith("\r") ? kept.slice(0, -1) : kept;
    const at = line++;
    const skipped = tooLong;
    kept = "";
    tooLong = false;
    if (at > MOST_LINES)
      throw new FormatError({ line: at, column: 1 }, `More than ${MOST_LINES} lines cannot be read.`);
    if (skipped)
      return [{ fault: new FormatError({ line: at, column: 1 }, `A line has at most ${LONGEST_LINE} characters.`) }];
    return text.trim() === "" ? [] : [lineOf(text, at)];
  }

  return {
    push(piece) {
      const found: NmeaLine[] = [];
      let from = 0;
      while (from <= piece.length) {
        const newline = piece.indexOf(LINE_FEED, from);
        const to = newline < 0 ? piece.length : newline;
        if (kept.length + to - from > LONGEST_LINE) tooLong = true;
        if (!tooLong) kept += textOf(piece, from, to);
        if (newline < 0) break;
        found.push(...finish());
        from = newline + 1;
      }
      return found;
    },
    end: () => (kept === "" && !tooLong ? [] : finish()),
  };
}

const LINE_FEED = 10;

const textOf = (piece: Uint8Array, from: number, to: number): string =>
  String.fromCharCode(...piece.subarray(from, to));

function lineOf(text: string, line: number): NmeaLine {
  try {
    return { sentence: readSentence(text, line) };
  } catch (error) {
    if (error instanceof FormatError) return { fault: error };
    throw error;
  }
}
