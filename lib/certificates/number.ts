import { checkCharacter } from "./checkCharacter";

/** 0-9 A-Z without I, L, O and U: 32 characters, so five bits of a random byte choose one without bias. */
const ALPHABET = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";
const BODY_LENGTH = 10;
/** Eight draws in nine give a check character of the alphabet; a hundred failures mean a broken generator. */
const MOST_DRAWS = 100;

// The prefix "LM" reads "1M" once letters that look like figures are folded.
const FOLDED = new RegExp(`^(?:1M)?([${ALPHABET}]{${BODY_LENGTH}})([${ALPHABET}])$`);
const LONGEST_TYPED = 64;

/** A new number "LM-XXXXX-XXXXX-C"; drawn again when the check character would be I, L, O or U. */
export function drawCertificateNumber(randomBytes: (count: number) => Uint8Array): string {
  for (let draw = 0; draw < MOST_DRAWS; draw += 1) {
    const body = Array.from(randomBytes(BODY_LENGTH), (byte) => ALPHABET[byte & 31]).join("");
    const check = checkCharacter(body);
    if (ALPHABET.includes(check)) return written(body, check);
  }
  throw new Error("drawCertificateNumber: the random generator repeats itself");
}

/**
 * Reads a number as people type it: any case, spaces and dashes of any kind, with or without the prefix,
 * O for 0, I or L for 1. "check-character" means the form is right and a character is wrong.
 */
export function readCertificateNumber(text: string): { number: string } | { problem: "form" | "check-character" } {
  if (text.length > LONGEST_TYPED) return { problem: "form" };
  const match = FOLDED.exec(fold(text));
  if (!match) return { problem: "form" };
  const [, body, check] = match;
  return checkCharacter(body) === check ? { number: written(body, check) } : { problem: "check-character" };
}

const written = (body: string, check: string) => `LM-${body.slice(0, 5)}-${body.slice(5)}-${check}`;

const fold = (text: string) =>
  text
    .normalize("NFKC")
    .toUpperCase()
    .replace(/[\s\p{Pd}\p{Cf}\u2212_.]/gu, "")
    .replaceAll("O", "0")
    .replace(/[IL]/g, "1");
