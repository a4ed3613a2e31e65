import { createHash } from "node:crypto";
import { createReadStream } from "node:fs";
import { open, readFile, stat } from "node:fs/promises";
import path from "node:path";
import { createSampleDecoder } from "@/lib/formats/decodeSamples";
import { FormatError } from "@/lib/formats/FormatError";
import { MOST_META_CHARACTERS, readSigmfMeta } from "@/lib/formats/readSigmfMeta";
import { bytesPerSample } from "@/lib/formats/sampleFormat";
import type { SigmfMeta } from "@/lib/formats/sigmfMeta";

/** A SigMF recording whose metadata are read and whose samples are still in their file. */
export type Recording = {
  meta: SigmfMeta & { sampleRateHz: number };
  /** Samples of the first capture. */
  sampleCount: number;
  /** The first so many samples; I and Q alternating when complex. */
  read(count: number): Promise<Float32Array>;
};

const MOST_HASHED_BYTES = 1e9;

/**
 * Opens FILE.sigmf-meta and the samples beside it. Of several captures the first is taken.
 * @throws Error with file, place and sentence
 */
export async function openRecording(file: string): Promise<Recording> {
  const metaFile = file.replace(/\.sigmf-data$/, ".sigmf-meta");
  if (!metaFile.endsWith(".sigmf-meta")) throw new Error(`${file}: a recording is named FILE.sigmf-meta`);
  const { size } = await stat(metaFile);
  if (size > MOST_META_CHARACTERS) throw new Error(`${metaFile}: ${size} bytes of metadata are too many`);
  const meta = await inFile(metaFile, async () => readSigmfMeta(await readFile(metaFile, "utf8")));
  const { sampleRateHz } = meta;
  if (sampleRateHz === null) throw new Error(`${metaFile}: core:sample_rate is needed to search`);
  if (meta.channels !== 1) throw new Error(`${metaFile}: ${meta.channels} channels; recordings of one are read`);
  const dataFile = path.join(path.dirname(metaFile), meta.dataset ?? path.basename(metaFile).replace(/meta$/, "data"));
  const bytes = (await stat(dataFile)).size;
  if (meta.sha512 && bytes <= MOST_HASHED_BYTES) await checkHash(dataFile, meta.sha512);
  const sampleBytes = bytesPerSample(meta.format);
  const headerBytes = meta.captures[0]?.headerBytes ?? 0;
  const held = bytes - headerBytes - meta.trailingBytes;
  if (meta.captures.length < 2 && held % sampleBytes !== 0)
    throw new Error(`${dataFile}:byte ${bytes - (held % sampleBytes)}: the samples end in the middle of one`);
  const sampleCount = Math.min(Math.floor(held / sampleBytes), meta.captures[1]?.sampleStart ?? Infinity);
  const read = (count: number) => inFile(dataFile, () => readSamples(dataFile, meta, headerBytes, count));
  return { meta: { ...meta, sampleRateHz }, sampleCount, read };
}

async function readSamples(file: string, { format }: SigmfMeta, start: number, count: number): Promise<Float32Array> {
  const samples = new Float32Array((format.complex ? 2 : 1) * count);
  if (count === 0) return samples;
  const decoder = createSampleDecoder(format);
  let filled = 0;
  const end = start + count * bytesPerSample(format) - 1;
  for await (const chunk of createReadStream(file, { start, end })) {
    const values = decoder.push(chunk as Buffer);
    samples.set(values, filled);
    filled += values.length;
  }
  decoder.end();
  return samples.subarray(0, filled);
}

async function checkHash(file: string, expected: string): Promise<void> {
  const hash = createHash("sha512");
  const handle = await open(file);
  for await (const chunk of handle.createReadStream()) hash.update(chunk as Buffer);
  if (hash.digest("hex") !== expected) throw new Error(`${file}: the samples are not those of core:sha512`);
}

/** Puts the file's name before the place that a format's fault names. */
async function inFile<T>(file: string, run: () => Promise<T>): Promise<T> {
  try {
    return await run();
  } catch (error) {
    if (error instanceof FormatError) throw new Error(`${file}:${error.message}`);
    throw error;
  }
}
