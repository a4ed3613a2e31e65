import { expect, test } from "vitest";
import { FormatError } from "@/lib/formats/FormatError";
import { readSigmfMeta } from "@/lib/formats/readSigmfMeta";
import type { SigmfMeta } from "@/lib/formats/sigmfMeta";
import { writeSigmfMeta } from "@/lib/formats/writeSigmfMeta";

// Fields and rules: SigMF specification 1.2.5 and its JSON schema.
const TEXT = `{
  "global": {
    "core:datatype": "ci16_le",
    "core:version": "1.2.5",
    "core:sample_rate": 4092000,
    "core:hw": "roof antenna, 30 dB amplifier",
    "site:mast": 7
  },
  "captures": [
    { "core:sample_start": 0, "core:frequency": 1575420000, "core:datetime": "2026-03-01T10:00:00.5Z" },
    { "core:sample_start": 40920 }
  ],
  "annotations": [
    { "core:sample_start": 100, "core:sample_count": 50, "core:label": "pulse", "core:freq_lower_edge": 1575400000 }
  ]
}
`;

test("reads what is said and keeps what it does not know", () => {
  const meta = readSigmfMeta(TEXT);
  expect(meta.format).toEqual({ complex: true, kind: "signed", bits: 16, littleEndian: true });
  expect(meta.sampleRateHz).toBe(4_092_000);
  expect(meta.channels).toBe(1);
  expect(meta.more).toEqual({ "core:hw": "roof antenna, 30 dB amplifier", "site:mast": 7 });
  expect(meta.captures.map(({ frequencyHz }) => frequencyHz)).toEqual([1_575_420_000, null]);
  expect(meta.captures[0].datetime).toBe("2026-03-01T10:00:00.5Z");
  expect(meta.annotations[0]).toEqual({
    sampleStart: 100,
    sampleCount: 50,
    lowerEdgeHz: 1_575_400_000,
    upperEdgeHz: null,
    label: "pulse",
    more: {},
  });
});

test("what was written is read, and is plain JSON for others", () => {
  const meta: SigmfMeta = {
    ...readSigmfMeta(TEXT),
    sha512: "a5".repeat(64),
    channels: 2,
    dataset: "roof.bin",
    trailingBytes: 4,
  };
  const text = writeSigmfMeta(meta);
  expect(readSigmfMeta(text)).toEqual(meta);
  expect(JSON.parse(text).global["core:datatype"]).toBe("ci16_le");
  expect(JSON.parse(text).captures[1]).toEqual({ "core:sample_start": 40920 });
});

const changed = (from: string, to: string) => TEXT.replace(from, to);

test.each<[string, string, number, number, RegExp]>([
  ["no text of JSON", changed('"captures": [', '"captures": '), 11, 5, /expected a key/],
  ["a list for an object", "[]", 1, 1, /object/],
  ["no global part", changed('"global"', '"globals"'), 1, 1, /no global/],
  ["no list of captures", changed('"captures"', '"capture"'), 1, 1, /no captures/],
  ["no list of annotations", changed('"annotations"', '"notes"'), 1, 1, /no annotations/],
  ["no datatype", changed("core:datatype", "core:data_type"), 2, 13, /no core:datatype/],
  ["no version", changed('"core:version": "1.2.5",', ""), 2, 13, /no core:version/],
  ["an unknown datatype", changed("ci16_le", "ci16"), 3, 22, /core:datatype/],
  ["a version that is a number", changed('"1.2.5"', "1.2"), 4, 21, /version/],
  ["a rate of nothing", changed("4092000", "0"), 5, 25, /core:sample_rate is a number from 1 to/],
  ["a rate in words", changed("4092000", '"4 MHz"'), 5, 25, /core:sample_rate/],
  ["a capture without its start", changed('{ "core:sample_start": 40920 }', "{}"), 11, 5, /no core:sample_start/],
  ["a start within a sample", changed("40920 }", "0.5 }"), 11, 28, /whole number/],
  ["a start before the beginning", changed("40920 }", "-1 }"), 11, 28, /from 0/],
  ["captures out of order", changed('"core:sample_start": 0', '"core:sample_start": 50000'), 11, 5, /ascending/],
  ["a time of day", changed("2026-03-01T10:00:00.5Z", "ten o'clock"), 10, 78, /ISO 8601/],
  [
    "a hash that is cut short",
    changed('"core:hw": "roof antenna, 30 dB amplifier"', '"core:sha512": "ab"'),
    6,
    20,
    /128/,
  ],
  ["a file somewhere else", changed('"core:hw": "roof', '"core:dataset": "../roof'), 6, 21, /beside/],
  [
    "an annotation in words",
    changed('"core:sample_start": 100', '"core:sample_start": "x"'),
    14,
    28,
    /core:sample_start/,
  ],
])("refuses %s at its place", (_what, text, line, column, sentence) => {
  let fault: unknown;
  try {
    readSigmfMeta(text);
  } catch (error) {
    fault = error;
  }
  expect(fault).toBeInstanceOf(FormatError);
  expect((fault as FormatError).position).toEqual({ line, column });
  expect((fault as FormatError).message).toMatch(sentence);
});

test("refuses a text without end before reading it", () => {
  expect(() => readSigmfMeta(" ".repeat(4_000_001))).toThrow(/4000001 characters/);
});
