import { FormatError } from "./FormatError";

/** JSON (RFC 8259) that remembers where each value stands, so that a fault in its meaning can be shown in the file. */
export type JsonNode = {
  /** Place of the value's first character in the text. */
  at: number;
} & (
  | { kind: "object"; members: Map<string, JsonNode> }
  | { kind: "array"; items: JsonNode[] }
  | { kind: "string"; value: string }
  | { kind: "number"; value: number }
  | { kind: "boolean"; value: boolean }
  | { kind: "null"; value: null }
);

const DEEPEST = 32;
const NUMBER = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][-+]?\d+)?/y;
const PLAIN = /[^"\\\u0000-\u001f]*/y;
const ESCAPES: Readonly<Record<string, string>> = {
  '"': '"',
  "\\": "\\",
  "/": "/",
  b: "\b",
  f: "\f",
  n: "\n",
  r: "\r",
  t: "\t",
};

/** @throws FormatError with line and column of the first character that cannot stand there */
export function readJson(text: string): JsonNode {
  let at = text.startsWith("\ufeff") ? 1 : 0;

  const fail = (sentence: string, where = at): never => {
    throw new FormatError(linePosition(text, where), sentence);
  };
  const skipBlanks = () => {
    while (at < text.length && " \t\n\r".includes(text[at])) at++;
  };
  const found = () => (at < text.length ? JSON.stringify(text[at]) : "the end of the text");
  const expect = (character: string, what: string) => {
    if (text[at] !== character) fail(`expected ${what}, found ${found()}.`);
    at++;
  };

  const value = (depth: number): JsonNode => {
    if (depth > DEEPEST) fail(`nested deeper than ${DEEPEST} levels.`);
    const start = at;
    switch (text[at]) {
      case "{":
        return { at: start, kind: "object", members: object(depth) };
      case "[":
        return { at: start, kind: "array", items: array(depth) };
      case '"':
        return { at: start, kind: "string", value: string() };
      case "t":
        return { at: start, kind: "boolean", value: word("true", true) };
      case "f":
        return { at: start, kind: "boolean", value: word("false", false) };
      case "n":
        return { at: start, kind: "null", value: word("null", null) };
      default:
        return { at: start, kind: "number", value: number() };
    }
  };

  const object = (depth: number): Map<string, JsonNode> => {
    const members = new Map<string, JsonNode>();
    at++;
    skipBlanks();
    if (text[at] === "}") at++;
    else
      do {
        skipBlanks();
        const keyAt = at;
        if (text[at] !== '"') fail(`expected a key in quotes, found ${found()}.`);
        const key = string();
        if (members.has(key)) fail(`the key ${JSON.stringify(key)} is given twice.`, keyAt);
        skipBlanks();
        expect(":", "a colon");
        skipBlanks();
        members.set(key, value(depth + 1));
      } while (another("}", "a comma or a closing brace"));
    return members;
  };

  const array = (depth: number): JsonNode[] => {
    const items: JsonNode[] = [];
    at++;
    skipBlanks();
    if (text[at] === "]") at++;
    else
      do {
        skipBlanks();
        items.push(value(depth + 1));
      } while (another("]", "a comma or a closing bracket"));
    return items;
  };

  const another = (closing: string, what: string): boolean => {
    skipBlanks();
    if (text[at] === closing) {
      at++;
      return false;
    }
    expect(",", what);
    return true;
  };

  const string = (): string => {
    let read = "";
    at++;
    for (;;) {
      PLAIN.lastIndex = at;
      const plain = PLAIN.exec(text)![0];
      read += plain;
      at += plain.length;
      if (text[at] === '"') break;
      if (text[at] !== "\\")
        fail(at < text.length ? "a control character stands in a string." : "a string has no end.");
      read += escape();
    }
    at++;
    return read;
  };

  const escape = (): string => {
    const letter = text[at + 1] ?? "";
    if (letter === "u" && /^[0-9a-fA-F]{4}$/.test(text.slice(at + 2, at + 6))) {
      const code = Number.parseInt(text.slice(at + 2, at + 6), 16);
      at += 6;
      return String.fromCharCode(code);
    }
    if (!Object.hasOwn(ESCAPES, letter)) fail(`\\${letter} is no escape of JSON.`);
    at += 2;
    return ESCAPES[letter];
  };

  const number = (): number => {
    NUMBER.lastIndex = at;
    const digits = NUMBER.exec(text)?.[0];
    if (digits === undefined) return fail(`expected a value, found ${found()}.`);
    const read = Number(digits);
    if (!Number.isFinite(read)) fail(`${digits} is larger than any number here.`);
    at += digits.length;
    return read;
  };

  const word = <T>(spelling: string, meaning: T): T => {
    if (text.slice(at, at + spelling.length) !== spelling) fail(`expected a value, found ${found()}.`);
    at += spelling.length;
    return meaning;
  };

  skipBlanks();
  const root = value(0);
  skipBlanks();
  if (at < text.length) fail(`the text goes on after its value, with ${found()}.`);
  return root;
}

/** Line and column, from 1, of a place in a text. */
export function linePosition(text: string, at: number): { line: number; column: number } {
  const before = text.slice(0, at);
  const line = before.split("\n").length;
  return { line, column: at - before.lastIndexOf("\n") };
}

/** The plain value of a node, as JSON.parse would give it. */
export function plainJson(node: JsonNode): unknown {
  if (node.kind === "array") return node.items.map(plainJson);
  if (node.kind !== "object") return node.value;
  return Object.fromEntries([...node.members].map(([key, member]) => [key, plainJson(member)]));
}
