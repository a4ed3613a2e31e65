/** Logic levels as text, "0" and "1", first chip first. */
export const bitsOf = (levels: Uint8Array): string => Buffer.from(levels.map((level) => 48 + level)).toString("latin1");

/** Octal digits of a text of bits, three each, first bit highest; the length is a multiple of three. */
export const octalOf = (bits: string): string => bits.replace(/.{3}/g, (three) => String(Number.parseInt(three, 2)));
