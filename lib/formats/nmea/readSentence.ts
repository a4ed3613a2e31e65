import { FormatError } from "../FormatError";
import { nmeaChecksum } from "./checksum";

export type Sentence = { line: number; talker: string; type: string; fields: readonly string[] };

const PARTS = /^\$([^*]*)(?:\*(.*))?$/;

/**
 * One line of a log as a sentence: `$GPGSV,3,1,...*7F`. A maker's own sentence has the talker P.
 * @param text without its line end
 * @throws FormatError with line and column: no sentence, a character that cannot be in one, no checksum or a wrong one
 */
export function readSentence(text: string, line: number): Sentence {
  const foreign = text.search(/[^\x20-\x7e]/);
  if (foreign >= 0)
    throw new FormatError({ line, column: foreign + 1 }, "A sentence holds printable ASCII characters only.");
  const parts = PARTS.exec(text);
  if (!parts) throw new FormatError({ line, column: 1 }, "A sentence begins with $.");
  const [, body, written] = parts;
  const end = body.length + 2;
  if (written === undefined)
    throw new FormatError({ line, column: end }, "The checksum is missing: * and two hexadecimal digits.");
  if (!/^[0-9A-Fa-f]{2}$/.test(written))
    throw new FormatError({ line, column: end + 1 }, `“${written.slice(0, 20)}” is not two hexadecimal digits.`);
  const sum = nmeaChecksum(body);
  if (written.toUpperCase() !== sum)
    throw new FormatError({ line, column: end + 1 }, `The checksum is ${written}, and the characters give ${sum}.`);
  const [address, ...fields] = body.split(",");
  if (!/^(P[A-Z0-9]{2,}|[A-Z0-9]{5})$/.test(address))
    throw new FormatError({ line, column: 2 }, `“${address.slice(0, 20)}” does not name a talker and a sentence.`);
  const own = address.startsWith("P") ? 1 : 2;
  return { line, talker: address.slice(0, own), type: address.slice(own), fields };
}
