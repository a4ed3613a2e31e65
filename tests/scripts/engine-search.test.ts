import { createHash } from "node:crypto";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { encodeSamples } from "@/lib/formats/encodeSamples";
import { sampleFormatNamed } from "@/lib/formats/sampleFormat";
import type { SigmfMeta } from "@/lib/formats/sigmfMeta";
import { writeSigmfMeta } from "@/lib/formats/writeSigmfMeta";
import { search } from "@/scripts/engine/search";
import { UsageError } from "@/scripts/engine/UsageError";
import { expectNear } from "@/tests/support/expectNear";
import { rawCapture } from "../gnss/search/rawCapture";

const CARRIER_HZ = 1575.42e6; // IS-GPS-200, 3.3.1.1
const satellite = { prn: 17, codePhaseChips: 250.5, dopplerHz: -1730, cn0DbHz: 44 };
let folder: string;
beforeAll(() => void (folder = mkdtempSync(path.join(tmpdir(), "engine-search-"))));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** Writes a recording of 10 ms with one satellite in it. @returns the metadata's file */
function record(name: string, datatype: string, rateHz: number, ifHz: number, change: Partial<SigmfMeta> = {}): string {
  const format = sampleFormatNamed(datatype)!;
  const scene = { seed: "71".repeat(32), rateHz, ifHz, durationMs: 10, satellites: [satellite] };
  const { samples } = rawCapture({ ...scene, complex: format.complex });
  const gain = format.kind === "float" ? 1 : format.bits === 8 ? 30 : 3000;
  const { bytes } = encodeSamples(
    format,
    samples.map((value) => gain * value),
  );
  writeFileSync(path.join(folder, `${name}.sigmf-data`), bytes);
  const capture = { sampleStart: 0, frequencyHz: CARRIER_HZ - ifHz, datetime: null, headerBytes: 0, more: {} };
  const meta: SigmfMeta = {
    format,
    version: "1.2.5",
    sampleRateHz: rateHz,
    channels: 1,
    sha512: createHash("sha512").update(bytes).digest("hex"),
    dataset: null,
    trailingBytes: 0,
    more: {},
    captures: [capture],
    annotations: [],
    ...change,
  };
  writeFileSync(path.join(folder, `${name}.sigmf-meta`), writeSigmfMeta(meta));
  return path.join(folder, `${name}.sigmf-meta`);
}

async function linesOf(...args: string[]): Promise<Record<string, unknown>[]> {
  const lines: Record<string, unknown>[] = [];
  await search(args, async (line) => void lines.push(line as Record<string, unknown>));
  return lines;
}

test.each([
  ["ci8", 2.048e6, 0],
  ["cu8", 2.4e6, 0],
  ["ci16_le", 4.5e6, 1.25e6], // not 4.092: four samples to every hard chip would show its edge to a quarter of a chip only
  ["cf32_le", 2.1e6, 0],
  ["ri8", 5.456e6, 1.25e6],
  ["ri16_le", 5.456e6, 4.092e6],
])("finds the satellite of a %s recording", async (datatype, rateHz, ifHz) => {
  const lines = await linesOf(record(datatype, datatype, rateHz, ifHz), "--signal", "GPS_L1CA");
  expect(lines).toHaveLength(1);
  const [line] = lines;
  expect(Object.keys(line)).toEqual(["prn", "codePhaseChips", "dopplerHz", "cn0DbHz", "peakToThresholdDb", "verdict"]);
  expect(line.prn).toBe(17);
  expect(line.verdict).toBe("genuine");
  expectNear(line.codePhaseChips as number, 250.5, 0.12, "code phase in chips");
  expectNear(line.dopplerHz as number, -1730, 40, "Doppler in Hz");
  expectNear(line.cn0DbHz as number, 44, 1.5, "C/N0 in dB-Hz");
  expect(line.peakToThresholdDb as number).toBeGreaterThan(3);
});

test("a list of numbers, a longer coherent sum and a carrier given by hand", async () => {
  const file = record("options", "ci8", 2.048e6, 0, { captures: [] });
  const options = ["--prn", "3,16-18", "--coherent-ms", "2", "--sums", "5", "--doppler", "2500", "--pfa", "1e-4"];
  const lines = await linesOf(file, ...options, "--if", "0");
  expect(lines.map(({ prn }) => prn)).toEqual([17]);
});

describe("refuses", () => {
  test.each<[string, string[]]>([
    ["no recording", []],
    ["two recordings", ["a.sigmf-meta", "b.sigmf-meta"]],
    ["an unknown signal", ["a.sigmf-meta", "--signal", "L9"]],
    ["an unknown flag", ["a.sigmf-meta", "--prns", "1"]],
    ["a list that is none", ["a.sigmf-meta", "--prn", "1..32"]],
    ["numbers without a code", ["a.sigmf-meta", "--prn", "900"]],
    ["a probability that is none", ["a.sigmf-meta", "--pfa", "2"]],
    ["a coherent time in words", ["a.sigmf-meta", "--coherent-ms", "one"]],
  ])("%s as a wrong call", async (_what, args) => {
    await expect(linesOf(...args)).rejects.toThrow(UsageError);
  });

  test("metadata with a fault, with file, line, column and sentence", async () => {
    const file = path.join(folder, "fault.sigmf-meta");
    writeFileSync(file, '{\n  "global": {"core:datatype": "ci12"}\n}\n');
    await expect(linesOf(file)).rejects.toThrow(`${file}:2:31: core:datatype is`);
  });

  test("samples that end within one, with the byte", async () => {
    const file = record("cut", "ci16_le", 2.048e6, 0, { sha512: null });
    writeFileSync(file.replace(/meta$/, "data"), new Uint8Array(4 * 20480 + 3));
    await expect(linesOf(file)).rejects.toThrow(/cut\.sigmf-data:byte 81920: the samples end/);
  });

  test("samples other than those of the hash", async () => {
    const file = record("hash", "ci8", 2.048e6, 0, { sha512: "ab".repeat(64) });
    await expect(linesOf(file)).rejects.toThrow(/core:sha512/);
  });

  test.each<[string, Partial<SigmfMeta>, RegExp]>([
    ["a recording without a rate", { sampleRateHz: null }, /core:sample_rate/],
    ["two channels", { channels: 2 }, /2 channels/],
    ["too many sums", {}, /longer than the capture/],
  ])("%s", async (_what, change, sentence) => {
    const file = record("refused", "ci8", 2.048e6, 0, change);
    await expect(linesOf(file, "--sums", "200")).rejects.toThrow(sentence);
  });
});
