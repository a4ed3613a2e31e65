import { createSampleDecoder } from "@/lib/formats/decodeSamples";
import { describeSamples, type SampleFacts } from "@/lib/formats/describeSamples";
import { readSigmfMeta } from "@/lib/formats/readSigmfMeta";
import { sampleFormatName, sampleFormatNamed, type SampleFormat } from "@/lib/formats/sampleFormat";
import { L1_HZ } from "@/lib/gnss/constants";
import { powerSpectrum, type Spectrum } from "@/lib/gnss/interference/spectrum";
import type { SampledCapture } from "@/lib/gnss/search/sampledCapture";

/** A recording on the person's own device. */
export type CaptureSource = {
  data: File;
  /** The `.sigmf-meta` file; null for a raw recording. */
  meta: File | null;
  /** What is typed in: for a raw recording, and for what metadata leave out. */
  typed: { format: string; rateHz: number; carrierHz: number };
};

export type CaptureDescription = {
  name: string;
  format: string;
  rateHz: number;
  /** Where L1 stands in the samples. */
  carrierHz: number;
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
  const { format, rateHz, carrierHz, firstByte, endByte } = await shapeOf(source);
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
  return { description: { name, format: sampleFormatName(format), rateHz, carrierHz, facts, spectrum }, capture };
}

async function shapeOf({ data, meta, typed }: CaptureSource) {
  if (data.size > MOST_CAPTURE_BYTES)
    throw new RangeError(`The recording has ${data.size} bytes; ${MOST_CAPTURE_BYTES} are read.`);
  if (!meta) {
    const format = sampleFormatNamed(typed.format);
    if (!format) throw new RangeError(`${typed.format} is no sample format.`);
    return { format, rateHz: typed.rateHz, carrierHz: typed.carrierHz, firstByte: 0, endByte: data.size };
  }
  const { format, sampleRateHz, channels, captures, trailingBytes } = readSigmfMeta(await meta.text());
  if (channels !== 1) throw new RangeError(`The recording has ${channels} channels; one is read.`);
  if (captures.length > 1 && captures.some(({ headerBytes }) => headerBytes > 0))
    throw new RangeError("The recording has headers between its captures; one stretch of samples is read.");
  const frequencyHz = captures[0]?.frequencyHz ?? null;
  return {
    format,
    rateHz: sampleRateHz ?? typed.rateHz,
    carrierHz: frequencyHz === null ? typed.carrierHz : L1_HZ - frequencyHz,
    firstByte: captures[0]?.headerBytes ?? 0,
    endByte: data.size - trailingBytes,
  };
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
