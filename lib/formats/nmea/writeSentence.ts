import { nmeaChecksum } from "./checksum";

/** From `$` to the line's end, both included: IEC 61162-1 (NMEA 0183), from memory. */
const LONGEST_SENTENCE = 82;
const ADDRESS = /^[A-Z0-9]{4,8}$/;
const FIELD = /^[\x20-\x7e]*$/;
const RESERVED = /[$!*,\\^~]/;

/**
 * One sentence with checksum and line end.
 * @param address talker and type: "GPGSV"
 * @throws RangeError for what no sentence can hold: a reserved character, or more than 82 characters in all
 */
export function writeSentence(address: string, fields: readonly string[]): string {
  if (!ADDRESS.test(address)) throw new RangeError(`writeSentence: talker and type in capitals, got ${address}`);
  const wrong = fields.find((field) => !FIELD.test(field) || RESERVED.test(field));
  if (wrong !== undefined) throw new RangeError(`writeSentence: ${JSON.stringify(wrong)} cannot stand in a field`);
  const body = [address, ...fields].join(",");
  const sentence = `$${body}*${nmeaChecksum(body)}\r\n`;
  if (sentence.length > LONGEST_SENTENCE)
    throw new RangeError(`writeSentence: at most ${LONGEST_SENTENCE} characters, got ${sentence.length}`);
  return sentence;
}
