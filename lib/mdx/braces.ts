import type { Expression, Program } from "acorn";

/**
 * Stands where the parser expects a JavaScript parser. Nothing in a module is JavaScript: all the parser has to know is where
 * a brace closes, and a fault inside must not hide the faults after it. The values are read later, see literal.ts.
 */
export const braces = {
  parse: (source: string) => program(source),
  parseExpressionAt(source: string): Expression {
    // The parser wraps `{...spread}` so that it is an object.
    const inner = source.startsWith("({") && source.endsWith("})") ? source.slice(2, -2) : source;
    if (!closed(inner)) {
      // The parser reads on when the fault lies at the end of what it has.
      throw Object.assign(new SyntaxError("A brace is not closed"), { pos: 0, raisedAt: source.length });
    }
    return { type: "ObjectExpression", properties: [], start: 0, end: source.length };
  },
};

const program = (source: string): Program => ({
  type: "Program",
  start: 0,
  end: source.length,
  body: [],
  sourceType: "module",
});

/** Whether the next closing brace ends the value: quoted text and comments are passed over. */
function closed(source: string): boolean {
  let open = 0;
  let lineEnd = -1;
  for (let at = 0; at < source.length; at++) {
    const character = source.charAt(at);
    if (character === "{") open++;
    else if (character === "}") open--;
    else if (source.startsWith("/*", at)) {
      const end = source.indexOf("*/", at + 2);
      if (end < 0) return false;
      at = end + 1;
    } else if (character === '"' || character === "'") {
      if (lineEnd < at) lineEnd = (source.indexOf("\n", at) + source.length + 1) % (source.length + 1);
      // A quote without a partner on its line is an apostrophe.
      const end = source.indexOf(character, at + 1);
      if (end >= 0 && end < lineEnd) at = end;
    }
  }
  return open <= 0;
}
