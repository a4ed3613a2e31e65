import { createHash } from "node:crypto";
import { expect, test } from "vitest";
import { readCapture, type CaptureSource } from "@/components/calculators/readCapture";

const typed = { format: "ci8", rateHz: 2e6, carrierHz: 0 };
const file = (name: string, content: BlobPart) => new File([content], name);
const read = (source: CaptureSource) => readCapture(source, () => {});
const meta = (global: object, capture: object = {}) =>
  file(
    "x.sigmf-meta",
    JSON.stringify({
      global: { "core:version": "1.2.5", ...global },
      captures: [{ "core:sample_start": 0, ...capture }],
      annotations: [],
    }),
  );

/** I = 40 cos, Q = 40 sin, a quarter of the rate above 0 Hz, on an offset of 5 in I. */
const quarter = () => Int8Array.from({ length: 8192 }, (_, n) => [45, 0, 5, 40, -35, 0, 5, -40][n % 8]);

// A line stands where its frequency is; power and offset of such a signal by hand.
test("a raw recording is what is typed in", async () => {
  const { description, capture } = await read({ data: file("x.bin", quarter()), meta: null, typed });
  const { facts, spectrum, format, rateHz } = description;
  expect([format, rateHz, facts.samples, facts.clippedShare]).toEqual(["ci8", 2e6, 4096, 0]);
  expect(facts.offset).toEqual([5, 0]);
  const densest = spectrum.densityPerHz.indexOf(Math.max(...spectrum.densityPerHz));
  expect(spectrum.offsetsHz[densest]).toBe(0.5e6);
  expect([...capture.samples.slice(0, 4)]).toEqual([40, 0, 0, 40]); // without the offset
});

// SigMF specification 1.2: core:frequency is what 0 Hz stands for, so L1 stands as far above as it lies below 1575.42 MHz.
test("metadata say type, rate, place of L1 and where the samples begin", async () => {
  const bytes = new Uint8Array(2 + 4096 * 2 + 3);
  const source = {
    data: file("x.sigmf-data", bytes),
    meta: meta(
      { "core:datatype": "ri16_le", "core:sample_rate": 5e6, "core:trailing_bytes": 3 },
      { "core:frequency": 1574.42e6, "core:header_bytes": 2 },
    ),
    typed,
  };
  const { format, rateHz, carrierHz, facts } = (await read(source)).description;
  expect([format, rateHz, carrierHz, facts.samples]).toEqual(["ri16_le", 5e6, 1e6, 4096]);
});

// SigMF specification 1.2: core:sha512 is of all bytes of the file; the reference is the runtime's own hash.
test("a hash is held against the bytes, and the data are read whatever it says", async () => {
  const data = file("x.sigmf-data", quarter());
  const sha512 = createHash("sha512").update(quarter()).digest("hex");
  const described = async (given: string) =>
    (await read({ data, meta: meta({ "core:datatype": "ci8", "core:sha512": given }), typed })).description;
  expect((await described(sha512)).hash).toBe("fits");
  expect((await described(sha512.toUpperCase())).hash).toBe("fits");
  const wrong = await described("ab".repeat(64));
  expect([wrong.hash, wrong.facts.samples]).toEqual(["differs", 4096]);
  expect((await read({ data, meta: null, typed })).description.hash).toBeNull();
});

test("says what of the typed in it was read with", async () => {
  const used = async (source: Omit<CaptureSource, "typed" | "data">) =>
    (await read({ data: file("x.bin", quarter()), typed, ...source })).description.readAsTyped;
  expect(await used({ meta: null })).toEqual(["format", "rateHz", "carrierHz"]);
  expect(await used({ meta: meta({ "core:datatype": "ci8" }) })).toEqual(["rateHz", "carrierHz"]);
  const whole = meta({ "core:datatype": "ci8", "core:sample_rate": 5e6 }, { "core:frequency": 1575.42e6 });
  expect(await used({ meta: whole })).toEqual([]);
});

test("faults are told by position", async () => {
  const odd = read({ data: file("x.bin", new Uint8Array(4097)), meta: null, typed });
  await expect(odd).rejects.toThrow("byte 4096: the samples end in the middle of one");
  const wrong = read({ data: file("x.bin", quarter()), meta: meta({ "core:datatype": "ci12" }), typed });
  await expect(wrong).rejects.toThrow(/^1:\d+: core:datatype is c or r/);
});

test("what is too large, too short or of several channels is refused", async () => {
  const large = new File([], "x.bin");
  Object.defineProperty(large, "size", { value: 20_000_001 });
  await expect(read({ data: large, meta: null, typed })).rejects.toThrow("20000000 are read");
  await expect(read({ data: file("x.bin", new Uint8Array(4)), meta: null, typed })).rejects.toThrow("too short");
  const two = meta({ "core:datatype": "ci8", "core:num_channels": 2 });
  await expect(read({ data: file("x", quarter()), meta: two, typed })).rejects.toThrow("2 channels");
});
