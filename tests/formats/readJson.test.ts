import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { FormatError } from "@/lib/formats/FormatError";
import { plainJson, readJson } from "@/lib/formats/readJson";

test("reads what the language's own reader reads, and gives the same", () => {
  fc.assert(
    fc.property(fc.json({ maxDepth: 5 }), (text) => {
      expect(plainJson(readJson(text))).toEqual(JSON.parse(text));
    }),
    { seed: 5, numRuns: 300 },
  );
});

test("refuses what the language's own reader refuses", () => {
  const pieces = fc.constantFrom(...'{}[]",:0123.eE+-\\u tfn \n'.split(""), "true", "null", '"a"', "1");
  fc.assert(
    fc.property(fc.array(pieces, { maxLength: 12 }), (parts) => {
      const text = parts.join("");
      let plain: unknown;
      try {
        plain = JSON.parse(text);
      } catch {
        expect(() => readJson(text)).toThrow(FormatError);
        return;
      }
      const twice = /"a"[^]*"a"/.test(text); // a key given twice is refused by us alone
      if (!twice) expect(plainJson(readJson(text))).toEqual(plain);
    }),
    { seed: 6, numRuns: 2000 },
  );
});

test("keeps a key that would reach for an object's ancestors as a plain key", () => {
  const plain = plainJson(readJson('{"__proto__": {"polluted": true}}')) as object;
  expect(Object.keys(plain)).toEqual(["__proto__"]);
  expect(({} as Record<string, unknown>).polluted).toBeUndefined();
});

// Each with the place of the first character that cannot stand there.
describe.each<[string, string, number, number]>([
  ["nothing", "", 1, 1],
  ["a comma too many", '{\n  "a": 1,\n}', 3, 1],
  ["a missing colon", '{"a" 1}', 1, 6],
  ["a word that is none", '{"a": nil}', 1, 7],
  ["a number with a leading zero", "[01]", 1, 3],
  ["a string without an end", '["abc', 1, 6],
  ["a line break inside a string", '["ab\nc"]', 1, 5],
  ["an escape that is none", '["\\x41"]', 1, 3],
  ["more text behind the value", "{} {}", 1, 4],
  ["a number beyond all numbers", "[1e999]", 1, 2],
  ["a key given twice", '{"a": 1,\n "a": 2}', 2, 2],
  ["nesting without end", "[".repeat(40), 1, 34],
])("%s", (_what, text, line, column) => {
  test("is refused at its place", () => {
    const fault = caught(() => readJson(text));
    expect(fault.position).toEqual({ line, column });
    expect(fault.message).toMatch(/^\d+:\d+: .+\.$/);
  });
});

function caught(run: () => unknown): FormatError {
  try {
    run();
  } catch (error) {
    if (error instanceof FormatError) return error;
    throw error;
  }
  throw new Error("nothing was refused");
}
