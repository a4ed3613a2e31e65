import { createSampleDecoder } from "@/lib/formats/decodeSamples";
import { describeSamples, type SampleFacts } from "@/lib/formats/describeSamples";
import { readSigmfMeta } from "@/lib/formats/readSigmfMeta";
import { sampleFormatName, sampleFormatNamed, type SampleFormat } from "@/lib/formats/sampleFormat";
import { L1_HZ } from "@/lib/gnss/constants";
import { powerSpectrum, type Spectrum } from "@/lib/gnss/interference/spectrum";
import type { SampledCapture } from "@/lib/gnss/search/sampledCapture";

/** What is typed in: for a raw recording, and for what metadata leave out. */
export type TypedFormat = { format: string; rateHz: number; carrierHz: number };

/** A recording on the person's own device. */
export type CaptureSource = {
  data: File;
  /** The `.sigmf-meta` file; null for a raw recording. */
  meta: File | null;
  typed: TypedFormat;
};

export type CaptureDescription = {
  name: string;
  format: string;
  rateHz: number;
  /** Where L1 stands in the samples. */
  carrierHz: number;
  /** What of the typed in it was read with. */
  readAsTyped: readonly (keyof TypedFormat)[];
  /** Whether the bytes are those that the metadata's hash was taken of; null without one. */
  hash: "fits" | "differs" | "cannot be checked" | null;
  facts: SampleFacts;
  spectrum: Spectrum;
};

export const MOST_CAPTURE_BYTES = 20_000_000;
const SLICE_BYTES = 1 << 20;
const SPECTRUM_POINTS = 1024;
const MOST_TRANSFORMS = 2000; // beyond it the average does not become smoother to the eye

/**
 * Reads a recording slice by slice and says what it is. The samples that come with it have their mean taken out, as a search
 * wants them; facts and spectrum are of the file as it stands.
 * @throws FormatError at the place of a fault, RangeError with what is not served
 */
export async function readCapture(
  source: CaptureSource,
  onProgress: (doneBytes: number, totalBytes: number) => void,
): Promise<{ description: CaptureDescription; capture: SampledCapture }> {
  const { format, rateHz, carrierHz, readAsTyped, sha512, firstByte, endByte } = await shapeOf(source);
  const hash = sha512 === null ? null : await compareHash(source.data, sha512);
  const values = await readValues(source.data.slice(firstByte, endByte), format, onProgress);
  const capture = { samples: values, complex: format.complex, rateHz, ifHz: carrierHz };
  const facts = describeSamples(values, format);
  const points = Math.min(SPECTRUM_POINTS, 2 ** Math.floor(Math.log2(facts.samples)));
  if (points < 4) throw new RangeError(`A recording of ${facts.samples} samples is too short for a spectrum.`);
  const step = Math.max(points / 2, Math.ceil(facts.samples / MOST_TRANSFORMS));
  const spectrum = powerSpectrum(capture, { points, window: "blackman-harris", step });
  const parts = facts.offset.length;
  for (let n = 0; n < values.length; n++) values[n] -= facts.offset[n % parts];
  const name = source.data.name;
  const read = { name, format: sampleFormatName(format), rateHz, carrierHz, readAsTyped, hash };
  return { description: { ...read, facts, spectrum }, capture };
}

async function shapeOf({ data, meta, typed }: CaptureSource) {
  if (data.size > MOST_CAPTURE_BYTES)
    throw new RangeError(`The recording has ${data.size} bytes; ${MOST_CAPTURE_BYTES} are read.`);
  if (!meta) {
    const format = sampleFormatNamed(typed.format);
    if (!format) throw new RangeError(`${typed.format} is no sample format.`);
    const readAsTyped: (keyof TypedFormat)[] = ["format", "rateHz", "carrierHz"];
    return { ...typed, format, readAsTyped, sha512: null, firstByte: 0, endByte: data.size };
  }
  const { format, sampleRateHz, channels, captures, trailingBytes, sha512 } = readSigmfMeta(await meta.text());
  if (channels !== 1) throw new RangeError(`The recording has ${channels} channels; one is read.`);
  if (captures.length > 1 && captures.some(({ headerBytes }) => headerBytes > 0))
    throw new RangeError("The recording has headers between its captures; one stretch of samples is read.");
  const frequencyHz = captures[0]?.frequencyHz ?? null;
  const readAsTyped: (keyof TypedFormat)[] = [];
  if (sampleRateHz === null) readAsTyped.push("rateHz");
  if (frequencyHz === null) readAsTyped.push("carrierHz");
  return {
    format,
    readAsTyped,
    sha512,
    rateHz: sampleRateHz ?? typed.rateHz,
    carrierHz: frequencyHz === null ? typed.carrierHz : L1_HZ - frequencyHz,
    firstByte: captures[0]?.headerBytes ?? 0,
    endByte: data.size - trailingBytes,
  };
}

/** `core:sha512` is taken of the whole file. Browsers hash on pages that come by HTTPS or from the device itself. */
async function compareHash(data: File, sha512: string): Promise<CaptureDescription["hash"]> {
  if (typeof crypto === "undefined" || !crypto.subtle) return "cannot be checked";
  const digest = new Uint8Array(await crypto.subtle.digest("SHA-512", await data.arrayBuffer()));
  const found = Array.from(digest, (byte) => byte.toString(16).padStart(2, "0")).join("");
  return found === sha512 ? "fits" : "differs";
}

async function readValues(bytes: Blob, format: SampleFormat, onProgress: (done: number, total: number) => void) {
  const decoder = createSampleDecoder(format);
  const values = new Float32Array(Math.floor((8 * bytes.size) / format.bits));
  let count = 0;
  for (let at = 0; at < bytes.size; at += SLICE_BYTES) {
    const slice = await bytes.slice(at, at + SLICE_BYTES).arrayBuffer();
    const decoded = decoder.push(new Uint8Array(slice));
    values.set(decoded, count);
    count += decoded.length;
    onProgress(Math.min(bytes.size, at + SLICE_BYTES), bytes.size);
  }
  decoder.end();
  return values;
}
