/** How one number of a recording is stored. SigMF specification, `core:datatype`. */
export type SampleFormat = {
  complex: boolean;
  kind: "float" | "signed" | "unsigned";
  bits: 8 | 16 | 32 | 64;
  littleEndian: boolean;
};

const NAME = /^([cr])(?:(f)(32|64)|([iu])(8|16|32))(_le|_be)?$/;

/**
 * Reads a name such as `ci16_le`. Numbers of one byte have no byte order; for all others the specification demands one.
 * @returns null when there is no such format
 */
export function sampleFormatNamed(name: string): SampleFormat | null {
  const found = NAME.exec(name);
  if (!found) return null;
  const [, part, float, floatBits, sign, wholeBits, order] = found;
  const bits = Number(float ? floatBits : wholeBits) as SampleFormat["bits"];
  if (bits > 8 && order === undefined) return null;
  const kind = float ? "float" : sign === "i" ? "signed" : "unsigned";
  return { complex: part === "c", kind, bits, littleEndian: order !== "_be" };
}

export function sampleFormatName({ complex, kind, bits, littleEndian }: SampleFormat): string {
  const letter = { float: "f", signed: "i", unsigned: "u" }[kind];
  return `${complex ? "c" : "r"}${letter}${bits}${bits === 8 ? "" : littleEndian ? "_le" : "_be"}`;
}

/** Bytes of one sample; a complex one has two numbers. */
export const bytesPerSample = ({ complex, bits }: SampleFormat): number => ((complex ? 2 : 1) * bits) / 8;

/** Unsigned numbers stand for signed ones above half of their range: 127.5 for eight bits. Common practice, no source. */
export const middleOf = ({ kind, bits }: SampleFormat): number =>
  kind === "unsigned" ? ({ 8: 0x7f, 16: 0x7fff, 32: 0x7fffffff, 64: 0 }[bits] ?? 0) + 0.5 : 0;
