import { describe, expect, test } from "vitest";
import { z } from "zod";
import { parsed } from "@/lib/auth/action";
import { formValues } from "@/lib/auth/formValues";
import { readBody } from "@/lib/auth/readBody";
import { unstorableField } from "@/lib/auth/unstorableField";
import { handInInput, saveAnswersInput } from "@/lib/schemas/answers";
import { ownerRows } from "../support/owner";

const NUL = "\u0000";
const HIGH_HALF = "\ud83d";
const LOW_HALF = "\ude00";

const TEXTS: [string, string, boolean][] = [
  ["a sentence", "Peak at 512 chips, −0,5 dB", true],
  ["line ends and tabs", "one\r\n\ttwo", true],
  ["an unseen character that can be kept", "a\u0001b\u200b", true],
  ["a character of two halves", "antenna \u{1f4e1}", true],
  ["the last code point", "\u{10ffff}\uffff", true],
  ["the character zero", `a${NUL}b`, false],
  ["a first half alone", `a${HIGH_HALF}`, false],
  ["a second half alone", `${LOW_HALF}a`, false],
  ["two halves the wrong way round", LOW_HALF + HIGH_HALF, false],
];

// PostgreSQL 15 documentation, 8.14 "JSON Types": \u0000 is refused by jsonb, and surrogates must stand in pairs.
// 8.3 "Character Types": the character with code zero cannot be stored. Here the server itself is asked.
test.each(TEXTS)("%s is refused exactly when PostgreSQL cannot keep it", async (_what, text, kept) => {
  expect(unstorableField(text) === null).toBe(kept);
  const json = JSON.stringify({ text });
  const read = ownerRows<{ text: string }>("SELECT $1::jsonb ->> 'text' AS text", [json]);
  if (kept) expect(await read).toEqual([{ text }]);
  else await expect(read).rejects.toThrow();
});

describe("a form", () => {
  const schema = z.object({ reason: z.string(), to: z.array(z.string()).optional(), log: z.file().optional() });
  const refused = (values: unknown, field: string) =>
    expect(() => parsed(schema, values)).toThrow(
      expect.objectContaining({
        status: 422,
        publicMessage: expect.stringContaining("Delete it"),
        fields: { [field]: [expect.stringMatching(/^The character U\+[0-9A-F]{4} cannot be seen/)] },
      }),
    );

  test("is refused at the field", () => {
    refused({ reason: `Not level${NUL}` }, "reason");
    refused({ reason: `Half ${HIGH_HALF}` }, "reason");
    refused({ reason: "Fine", to: ["one", `two${NUL}`] }, "to");
  });

  test("is refused for the name of a file", () => {
    const sent = new FormData();
    sent.set("reason", "The log");
    sent.set("log", new File(["$GPGGA"], `roof${NUL}.nmea`));
    refused(formValues(sent), "log");
  });

  test("is taken without such a character", () => {
    expect(parsed(schema, { reason: "Łukasz \u{1f4e1}" })).toEqual({ reason: "Łukasz \u{1f4e1}" });
  });

  test("may hold anything where nothing is stored", () => {
    expect(parsed(schema, { reason: NUL }, { stored: false })).toEqual({ reason: NUL });
  });
});

const request = (json: string) => new Request("http://a.test/", { method: "PUT", body: json });

test.each([
  ["the zero in an answer", String.raw`{"answers":{"reading.lag":"1\u0000"},"revision":1}`, saveAnswersInput],
  ["half a character in an answer", String.raw`{"answers":{"reading.lag":"\ud83d"},"revision":1}`, saveAnswersInput],
  ["the zero in the words", String.raw`{"answers":{},"words":"Seen\u0000"}`, handInInput],
])("a body with %s is refused with a sentence", async (_what, json, schema) => {
  await expect(readBody(request(json), schema)).rejects.toMatchObject({ status: 422 });
});
