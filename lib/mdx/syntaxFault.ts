import { problemAt, type Place, type Problem, type Range } from "@/lib/mdx/problem";
import type { SourceText } from "@/lib/mdx/sourceText";

/** What the parser throws. */
export type ParserStop = Error & { reason: string; ruleId?: string; place?: Place | { start: Place } };

export const isParserStop = (error: unknown): error is ParserStop =>
  error instanceof Error && "reason" in error && typeof error.reason === "string";

/** Why the parser stopped, and the stretch of source that it should not see when it is tried again. */
export type SyntaxFault = { problem: Problem; hide: { from: number; to: number } };

export function syntaxFault(error: ParserStop, source: SourceText): SyntaxFault {
  const reason = error.reason;
  if (error.ruleId === "end-tag-mismatch") return mismatch(reason, pointOf(error), source);
  const offset = source.offsetAt(pointOf(error) ?? { line: 1, column: 1 });
  if (error.ruleId === "unexpected-eof" && reason.includes("in expression")) return openBrace(source);
  if (error.ruleId === "unexpected-eof") return openTag(source.text.lastIndexOf("<", offset), source);
  const start = Math.max(0, source.text.lastIndexOf("<", offset));
  const beforeName = /^<\/?\s*$/.test(source.text.slice(start, offset));
  const lineEnd = source.offsetAt({ line: source.placeAt(offset).line + 1, column: 1 });
  const end = source.text.indexOf(">", offset) + 1 || lineEnd;
  return {
    problem: problemAt(source.placeAt(offset), "syntax", characterMessage(error, source.text.slice(start, offset))),
    // A stray sign is hidden alone; a tag that cannot be read is hidden as a whole.
    hide: beforeName ? { from: start, to: start + 1 } : { from: start, to: end },
  };
}

function pointOf(error: ParserStop): Place | null {
  const place = error.place && "start" in error.place ? error.place.start : error.place;
  return place ? { line: place.line, column: place.column } : null;
}

function characterMessage({ ruleId, reason }: ParserStop, before: string): string {
  if (ruleId === "unexpected-closing-slash")
    return "This closing tag closes nothing. Delete it, or open the tag before it.";
  if (ruleId === "unexpected-empty-expression") return 'The braces are empty. Write a value, such as {4} or "1 kHz".';
  if (ruleId === "unexpected-lazy")
    return "A tag or brace begun in a list or quotation goes on outside it. Indent its lines, or end it on the same line.";
  if (before === "<" && reason.includes("`!`")) return "HTML comments are not read. Write {/* ... */}.";
  if (/^<[a-z][a-z0-9.+-]*:/i.test(before) || reason.includes("to create a link")) {
    return "Addresses in angle brackets are not read. Write [text](https://address).";
  }
  if (reason.includes("before name") && before === "<") {
    return "A < before a sign or figure would open a tag. Write \\< for the sign, or put the formula between $ and $.";
  }
  if (reason.includes("before attribute value")) return 'A value stands in quotes or braces: a={5} or doppler="1 kHz".';
  const character = /^Unexpected character `(.+?)` \(/.exec(reason)?.[1];
  const what = character ? ` at ${character === "` ` `" ? "`" : character}` : "";
  return `The tag cannot be read${what}. Write it as <Name attribute="value" />.`;
}

function mismatch(reason: string, place: Place | null, source: SourceText): SyntaxFault {
  const [closing, opening] = [/closing tag `<\/(.*?)>`/.exec(reason)?.[1], /for `<(.*?)>`/.exec(reason)?.[1]];
  const stated = /\((\d+):(\d+)-(\d+):(\d+)\)/.exec(reason)?.slice(1).map(Number);
  const openAt: Range | null =
    stated && opening !== undefined
      ? { from: { line: stated[0] ?? 1, column: stated[1] ?? 1 }, to: { line: stated[2] ?? 1, column: stated[3] ?? 1 } }
      : null;
  if (!openAt) {
    const at = place ?? { line: 1, column: 1 };
    const from = source.offsetAt(at);
    const message = `</${closing ?? ""}> stands in another paragraph, list or quotation than its opening tag. Put both on lines of their own.`;
    return {
      problem: problemAt(at, "syntax", message),
      hide: { from, to: source.text.indexOf(">", from) + 1 || from + 1 },
    };
  }
  const name = opening ?? "";
  const met = closing === undefined ? "" : ` before </${closing}>`;
  const cure =
    name === ""
      ? "Delete it."
      : `Write </${name}> on a line of its own, or end the tag with /> when nothing is inside.`;
  return {
    problem: problemAt(openAt, "syntax", `<${name}> is opened here and not closed${met}. ${cure}`),
    hide: { from: source.offsetAt(openAt.from), to: source.offsetAt(openAt.to) },
  };
}

function openTag(start: number, source: SourceText): SyntaxFault {
  const from = Math.max(0, start);
  const message = "The tag opened here has no end. Close its quotes and braces, then end it with /> or >.";
  return { problem: problemAt(source.placeAt(from), "syntax", message), hide: { from, to: from + 1 } };
}

/** The parser names the end of the file; the lead needs the last brace that nothing after it closes. */
function openBrace(source: SourceText): SyntaxFault {
  let closing = 0;
  let at = source.text.length - 1;
  for (; at > 0; at--) {
    const character = source.text.charAt(at);
    if (character === "}") closing++;
    else if (character === "{" && closing-- === 0) break;
  }
  const message = "The brace opened here is never closed. Write \\{ for a brace that is to be seen.";
  return { problem: problemAt(source.placeAt(at), "syntax", message), hide: { from: at, to: at + 1 } };
}
