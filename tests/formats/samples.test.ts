import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { createSampleDecoder } from "@/lib/formats/decodeSamples";
import { encodeSamples } from "@/lib/formats/encodeSamples";
import { FormatError } from "@/lib/formats/FormatError";
import { bytesPerSample, sampleFormatName, sampleFormatNamed } from "@/lib/formats/sampleFormat";

// SigMF specification 1.2.5, schema: the pattern of core:datatype.
const KINDS = ["f32", "f64", "i32", "i16", "u32", "u16", "i8", "u8"];
const ALL = ["c", "r"].flatMap((part) =>
  KINDS.flatMap((kind) =>
    kind.endsWith("8") && !kind.startsWith("f") ? [part + kind] : [`${part + kind}_le`, `${part + kind}_be`],
  ),
);

test("knows every format of the specification, by its own name", () => {
  expect(ALL).toHaveLength(2 * (6 * 2 + 2));
  for (const name of ALL) expect(sampleFormatName(sampleFormatNamed(name)!)).toBe(name);
});

test.each(["", "ci16", "xi8", "ci12_le", "cf16_le", "ci8 ", "CI8", "ci16_me", "cf8"])("knows no %j", (name) => {
  expect(sampleFormatNamed(name)).toBeNull();
});

const decode = (name: string, bytes: number[]) => {
  const decoder = createSampleDecoder(sampleFormatNamed(name)!);
  const values = decoder.push(Uint8Array.from(bytes));
  decoder.end();
  return [...values];
};

// Bytes written down by hand: two's complement, byte order, IEEE 754.
test.each<[string, number[], number[]]>([
  ["ci8", [0x01, 0xff, 0x7f, 0x80], [1, -1, 127, -128]],
  ["ri8", [0x05, 0xfb], [5, -5]],
  ["cu8", [0, 255, 127, 128], [-127.5, 127.5, -0.5, 0.5]],
  ["ci16_le", [0x02, 0x01, 0xfe, 0xff], [258, -2]],
  ["ci16_be", [0x01, 0x02, 0xff, 0xfe], [258, -2]],
  ["ri16_le", [0x00, 0x80], [-32768]],
  ["ru16_be", [0x80, 0x00], [0.5]],
  ["cf32_le", [0, 0, 0x80, 0x3f, 0, 0, 0, 0xc0], [1, -2]],
  ["rf32_be", [0x3f, 0x80, 0, 0], [1]],
  ["rf64_le", [0, 0, 0, 0, 0, 0, 0xf8, 0x3f], [1.5]],
  ["ri32_be", [0xff, 0xff, 0xff, 0x00], [-256]],
])("%s", (name, bytes, values) => expect(decode(name, bytes)).toEqual(values));

test("where the chunks are cut does not matter", () => {
  const bytes = fc.uint8Array({ minLength: 0, maxLength: 96 });
  fc.assert(
    fc.property(
      fc.constantFrom("ci8", "ci16_le", "ri32_be", "cu16_le"),
      bytes,
      fc.infiniteStream(fc.nat(20)),
      (name, all, cuts) => {
        const format = sampleFormatNamed(name)!;
        const whole = all.slice(0, all.length - (all.length % bytesPerSample(format)));
        const decoder = createSampleDecoder(format);
        const pieces: number[] = [];
        let at = 0;
        for (const cut of cuts) {
          pieces.push(...decoder.push(whole.subarray(at, at + cut)));
          at += cut;
          if (cut > 0 && at >= whole.length) break;
        }
        decoder.end();
        expect(pieces).toEqual([...createSampleDecoder(format).push(whole)]);
      },
    ),
    { seed: 7, numRuns: 200 },
  );
});

describe("bad bytes", () => {
  test("that end within a sample are refused with the sample's place", () => {
    const decoder = createSampleDecoder(sampleFormatNamed("ci16_le")!);
    decoder.push(new Uint8Array(8));
    decoder.push(new Uint8Array(3));
    expect(() => decoder.end()).toThrow(
      new FormatError({ byte: 8 }, "the samples end in the middle of one: 3 of its 4 bytes are there."),
    );
  });

  test("that are no number are refused with their place, whatever the chunk", () => {
    const decoder = createSampleDecoder(sampleFormatNamed("cf32_le")!);
    decoder.push(new Uint8Array(16));
    const broken = Uint8Array.from([0, 0, 0, 0, 0, 0, 0xc0, 0x7f]); // a quiet NaN in Q
    expect(() => decoder.push(broken)).toThrow("byte 20: NaN is no sample.");
  });
});

test.each(ALL)("%s: what was encoded is decoded", (name) => {
  const format = sampleFormatNamed(name)!;
  const values = format.kind === "unsigned" ? [-3.5, 2.5, 0.5, -0.5] : [-3, 2, 0, 1];
  const { bytes, clipped } = encodeSamples(format, values);
  expect(clipped).toBe(0);
  expect([...createSampleDecoder(format).push(bytes)]).toEqual(values.map(Math.fround));
});

test("whole numbers round to the nearest and clip at the ends, which is counted", () => {
  const { bytes, clipped } = encodeSamples(sampleFormatNamed("ci8")!, [1.4, -1.6, 200, -200]);
  expect([...new Int8Array(bytes.buffer)]).toEqual([1, -2, 127, -128]);
  expect(clipped).toBe(2);
});
