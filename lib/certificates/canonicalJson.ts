import { createHash } from "node:crypto";

/**
 * JSON by RFC 8785 (JSON Canonicalization Scheme), with string values brought to Unicode normal form C first, so that a
 * name typed on two keyboards gives one fingerprint. Property names are our own words and stay as they are.
 * @throws RangeError for anything JSON cannot say exactly: NaN, infinities, undefined, lone surrogates, cycles, class instances
 */
export function canonicalJson(value: unknown): string {
  return write(value, "$", new Set());
}

/** SHA-256 of the canonical JSON in UTF-8, 64 lower-case hexadecimal figures. */
export function fingerprintOf(value: unknown): string {
  return createHash("sha256").update(canonicalJson(value), "utf8").digest("hex");
}

function write(value: unknown, at: string, open: Set<object>): string {
  if (value === null || value === true || value === false) return String(value);
  if (typeof value === "string") return writeString(value.normalize("NFC"), at);
  if (typeof value === "number") return writeNumber(value, at);
  if (typeof value !== "object") throw new RangeError(`canonicalJson: ${at} is ${typeof value}`);
  if (open.has(value)) throw new RangeError(`canonicalJson: ${at} contains itself`);
  open.add(value);
  const text = Array.isArray(value) ? writeArray(value, at, open) : writeObject(value, at, open);
  open.delete(value);
  return text;
}

// RFC 8785, 3.2.2.3: the number serialization of ECMAScript, which writes minus zero as 0.
function writeNumber(value: number, at: string): string {
  if (!Number.isFinite(value)) throw new RangeError(`canonicalJson: ${at} is ${value}`);
  return String(value);
}

// RFC 8785, 3.2.2.2: the escapes of ECMAScript's JSON; a lone surrogate is an error.
function writeString(value: string, at: string): string {
  if (/\p{Surrogate}/u.test(value)) throw new RangeError(`canonicalJson: ${at} holds half a character`);
  return JSON.stringify(value);
}

function writeArray(list: unknown[], at: string, open: Set<object>): string {
  // Array.from, not map: map would leave a hole out and say nothing.
  return `[${Array.from(list, (item, index) => write(item, `${at}[${index}]`, open)).join(",")}]`;
}

function writeObject(value: object, at: string, open: Set<object>): string {
  const prototype: unknown = Object.getPrototypeOf(value);
  if (prototype !== Object.prototype && prototype !== null) {
    throw new RangeError(`canonicalJson: ${at} is not a plain object`);
  }
  // RFC 8785, 3.2.3: by UTF-16 code units, which is what sort() compares.
  const members = Object.entries(value)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, member]) => `${writeString(name, at)}:${write(member, `${at}.${name}`, open)}`);
  return `{${members.join(",")}}`;
}
