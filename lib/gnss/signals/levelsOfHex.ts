import type { Levels } from "../shiftRegister";

/** Logic levels written as hexadecimal digits, highest bit of each digit first; the last digit may be filled up. */
export const levelsOfHex = (hex: string, length: number): Levels =>
  Uint8Array.from({ length }, (_, n) => (Number.parseInt(hex[n >> 2]!, 16) >> (3 - (n & 3))) & 1);
