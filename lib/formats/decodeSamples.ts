import { FormatError } from "./FormatError";
import { bytesPerSample, middleOf, type SampleFormat } from "./sampleFormat";

/**
 * Turns a recording's bytes into numbers, chunk by chunk, wherever the chunks are cut. Complex samples come as I and Q
 * alternating; unsigned numbers are moved so that their middle is zero. It holds no more than one chunk.
 */
export function createSampleDecoder(format: SampleFormat) {
  const sampleBytes = bytesPerSample(format);
  const read = readerOf(format);
  let rest = new Uint8Array(0);
  let position = 0; // of the first byte of `rest`

  /** @throws FormatError at a number that is none (NaN, infinite) */
  const push = (chunk: Uint8Array): Float32Array => {
    const bytes = rest.length === 0 ? chunk : joined(rest, chunk);
    const samples = Math.floor(bytes.length / sampleBytes);
    const view = new DataView(bytes.buffer, bytes.byteOffset, samples * sampleBytes);
    const values = new Float32Array((8 * samples * sampleBytes) / format.bits);
    read(values, view);
    if (format.kind === "float") refuseBroken(values, position, format.bits / 8);
    rest = bytes.slice(samples * sampleBytes);
    position += samples * sampleBytes;
    return values;
  };

  /** @throws FormatError when the bytes end within a sample */
  const end = (): void => {
    if (rest.length > 0)
      throw new FormatError(
        { byte: position },
        `the samples end in the middle of one: ${rest.length} of its ${sampleBytes} bytes are there.`,
      );
  };
  return { push, end };
}

function joined(first: Uint8Array, second: Uint8Array): Uint8Array {
  const all = new Uint8Array(first.length + second.length);
  all.set(first);
  all.set(second, first.length);
  return all;
}

/** Fills the list from the view; one loop for each kind of number, since this runs for every sample of a recording. */
function readerOf(format: SampleFormat): (out: Float32Array, view: DataView) => void {
  const { kind, bits, littleEndian: little } = format;
  const middle = middleOf(format);
  const each = (get: (view: DataView, at: number) => number) => (out: Float32Array, view: DataView) => {
    for (let n = 0; n < out.length; n++) out[n] = get(view, (n * bits) / 8) - middle;
  };
  if (kind === "float")
    return each((view, at) => (bits === 32 ? view.getFloat32(at, little) : view.getFloat64(at, little)));
  if (kind === "signed") {
    if (bits === 8) return each((view, at) => view.getInt8(at));
    return each((view, at) => (bits === 16 ? view.getInt16(at, little) : view.getInt32(at, little)));
  }
  if (bits === 8) return each((view, at) => view.getUint8(at));
  return each((view, at) => (bits === 16 ? view.getUint16(at, little) : view.getUint32(at, little)));
}

function refuseBroken(values: Float32Array, position: number, valueBytes: number): void {
  const at = values.findIndex((value) => !Number.isFinite(value));
  if (at >= 0) throw new FormatError({ byte: position + at * valueBytes }, `${values[at]} is no sample.`);
}
