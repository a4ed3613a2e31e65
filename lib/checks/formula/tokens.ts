import { ExpressionFault } from "./expression";

export type Token = { at: number; text: string; sort: "number" | "name" | "sign" | "end" };

/** Matched one after the other from where the last one ended; each is linear in its length. */
const SPACE = /[\s\u00a0]*/y;
const NUMBER = /(?:[0-9]+(?:\.[0-9]*)?|\.[0-9]+)(?:[eE][+-]?[0-9]+)?/y;
const NAME = /[A-Za-z_][A-Za-z0-9_]*/y;
const SIGNS = "+-*/^(),";

/** What people write for a sign of the grammar. */
const MEANT: Readonly<Record<string, string>> = {
  "\u2212": "-",
  "\u00d7": "*",
  "\u00b7": "*",
  "\u00f7": "/",
  "[": "(",
  "]": ")",
};

/** @throws ExpressionFault at the first character that the grammar does not have */
export function tokensOf(text: string): Token[] {
  const tokens: Token[] = [];
  let at = matchAt(SPACE, text, 0).length;
  while (at < text.length) {
    const token = tokenAt(text, at);
    tokens.push(token);
    at += token.text.length;
    at += matchAt(SPACE, text, at).length;
  }
  return [...tokens, { at, text: "", sort: "end" }];
}

function tokenAt(text: string, at: number): Token {
  const number = matchAt(NUMBER, text, at);
  if (number) return { at, text: number, sort: "number" };
  const name = matchAt(NAME, text, at);
  if (name) return { at, text: name, sort: "name" };
  const sign = text.charAt(at);
  if (SIGNS.includes(sign)) return { at, text: sign, sort: "sign" };
  const meant = MEANT[sign];
  throw new ExpressionFault(meant ? `Write ${meant} for ${sign}.` : `${JSON.stringify(sign)} ${NOT_THERE}`, at);
}

const NOT_THERE = "is not part of a formula. It has numbers, names, + - * / ^, brackets and commas.";

function matchAt(pattern: RegExp, text: string, at: number): string {
  pattern.lastIndex = at;
  return pattern.exec(text)?.[0] ?? "";
}
