import { middleOf, type SampleFormat } from "./sampleFormat";

/**
 * The bytes of samples in a format; the inverse of `createSampleDecoder`. Whole-number formats round to the nearest and clip
 * at their ends.
 * @param values I and Q alternating when complex, in the format's own counts
 */
export function encodeSamples(format: SampleFormat, values: ArrayLike<number>): { bytes: Uint8Array; clipped: number } {
  const { kind, bits, littleEndian: little } = format;
  const bytes = new Uint8Array((values.length * bits) / 8);
  const view = new DataView(bytes.buffer);
  const middle = middleOf(format);
  const lowest = kind === "signed" ? -TWO_TO[bits] / 2 : 0;
  const highest = lowest + TWO_TO[bits] - 1;
  let clipped = 0;
  for (let n = 0; n < values.length; n++) {
    const at = (n * bits) / 8;
    if (kind === "float") {
      if (bits === 32) view.setFloat32(at, values[n], little);
      else view.setFloat64(at, values[n], little);
      continue;
    }
    const count = Math.floor(values[n] + middle + 0.5);
    const held = Math.min(highest, Math.max(lowest, count));
    if (held !== count) clipped++;
    if (bits === 8) view.setUint8(at, held & 0xff);
    else if (bits === 16) view.setUint16(at, held & 0xffff, little);
    else view.setUint32(at, held >>> 0, little);
  }
  return { bytes, clipped };
}

const TWO_TO: Readonly<Record<number, number>> = { 8: 256, 16: 65_536, 32: 4_294_967_296 };
