import { LIMITS, MARKS_PER_BLOCK, MARKS_PER_MODULE } from "@/lib/mdx/limits";
import { problemAt, type Problem } from "@/lib/mdx/problem";

/**
 * One pass over the source before any parser sees it. Refuses what is outside the bounds of the language and what is known
 * to keep the parser busy; at most one problem of each rule, so that a hostile text does not become a long list.
 */
export function precheck(source: string): Problem[] {
  const problems = new Map<string, Problem>();
  const refuse = (rule: string, line: number, column: number, message: string) => {
    if (!problems.has(rule)) problems.set(rule, problemAt({ line, column }, rule, message));
  };
  const bytes = new TextEncoder().encode(source).length;
  if (bytes > LIMITS.bytes) {
    refuse(
      "size",
      1,
      1,
      `The module is ${Math.ceil(bytes / 1024)} kB long; 64 kB is the most. Move a part to another module.`,
    );
    return [...problems.values()];
  }
  const lines = source.split(/\r\n|\r|\n/);
  if (lines.length > LIMITS.lines) {
    refuse(
      "size",
      LIMITS.lines + 1,
      1,
      `The module has ${lines.length} lines; 2,000 is the most. Move a part to another module.`,
    );
    return [...problems.values()];
  }
  const whole: Record<string, number> = {};
  let block: Record<string, number> = {};
  let furtherMarkers = 0;
  lines.forEach((text, index) => {
    const line = index + 1;
    if (text.trim() === "") block = {};
    const unreadable = UNREADABLE.exec(text);
    if (unreadable) refuse("character", line, unreadable.index + 1, nameOf(unreadable[0]));
    const nesting = openers(text);
    if (nesting.count > LIMITS.nesting || nesting.indentColumns > MARKER_INDENT_COLUMNS) {
      refuse("nesting", line, 1, `Lists and quotations are nested more than ${LIMITS.nesting} deep. Start a new list.`);
    }
    furtherMarkers += Math.max(0, nesting.count - 1);
    if (furtherMarkers > LIMITS.furtherMarkers) {
      refuse(
        "nesting",
        line,
        1,
        "Too many lists and quotations begin inside others on the same line. Give each marker its own line.",
      );
    }
    const row = /([[({<*_~])\1{99}/.exec(text);
    if (row)
      refuse(
        "marks",
        line,
        row.index + 1,
        `A hundred ${row[1]} in a row cannot be read. Put the text in a code block.`,
      );
    for (let at = 0; at < text.length; at++) {
      const mark = text.charAt(at);
      const most = MARKS_PER_BLOCK[mark];
      if (most === undefined) continue;
      block[mark] = (block[mark] ?? 0) + 1;
      whole[mark] = (whole[mark] ?? 0) + 1;
      if (block[mark] > most) {
        refuse(
          "marks",
          line,
          at + 1,
          `More than ${most} of ${mark} stand in one block. Put an empty line between parts.`,
        );
      } else if (whole[mark] > (MARKS_PER_MODULE[mark] ?? Infinity)) {
        refuse(
          "marks",
          line,
          at + 1,
          `More than ${MARKS_PER_MODULE[mark]} of ${mark} stand in one module. Move a part to another.`,
        );
      }
    }
  });
  return [...problems.values()];
}

/** Eight list levels of at most five columns each; deeper indentation before a marker is nesting by another name. */
const MARKER_INDENT_COLUMNS = 40;

// Controls, lone halves of a character, and the marks that turn the reading direction: the text would not be what it looks like.
const UNREADABLE = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f\u202a-\u202e\u2066-\u2069]|\p{Cs}/u;

const nameOf = (character: string) =>
  `The character U+${character.codePointAt(0)?.toString(16).toUpperCase().padStart(4, "0")} cannot be seen and is not read. Delete it.`;

/** Block quote and list markers that open one line, and the columns before the last of them. */
function openers(text: string): { count: number; indentColumns: number } {
  let count = 0;
  let columns = 0;
  let indentColumns = 0;
  let at = 0;
  while (at < text.length) {
    const character = text.charAt(at);
    if (character === " " || character === "\t") {
      columns += character === "\t" ? 4 : 1;
      at++;
      continue;
    }
    const marker = character === ">" ? 1 : listMarkerLength(text, at);
    if (marker === 0) break;
    count++;
    indentColumns = columns;
    columns += marker;
    at += marker;
  }
  return { count, indentColumns };
}

function listMarkerLength(text: string, at: number): number {
  let end = at;
  while (end - at < 9 && text.charAt(end) >= "0" && text.charAt(end) <= "9") end++;
  const ordered = end > at && (text.charAt(end) === "." || text.charAt(end) === ")");
  const bullet = end === at && "-+*".includes(text.charAt(at));
  if (!ordered && !bullet) return 0;
  const next = text.charAt(end + 1);
  return next === "" || next === " " || next === "\t" ? end + 1 - at : 0;
}
