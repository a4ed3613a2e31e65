import "server-only";
import { createCipheriv, createDecipheriv, randomBytes } from "node:crypto";

export type Secret = { seedHex: string; truth: unknown };

// NIST SP 800-38D: 96-bit nonces drawn at random, 128-bit tags; one key seals far fewer than 2^32 cases.
const ALGORITHM = "aes-256-gcm";
const NONCE_BYTES = 12;
const TAG_BYTES = 16;

/** Nonce, tag and ciphertext in one. The case's id is bound in, so that a sealed secret opens for its own case only. */
export function sealSecret(secret: Secret, caseId: string, seedKey: string): Buffer {
  const nonce = randomBytes(NONCE_BYTES);
  const cipher = createCipheriv(ALGORITHM, keyBytes(seedKey), nonce).setAAD(Buffer.from(caseId));
  const text = Buffer.concat([cipher.update(JSON.stringify(secret), "utf8"), cipher.final()]);
  return Buffer.concat([nonce, cipher.getAuthTag(), text]);
}

/** @throws Error when the key is another one, or seal or case id were changed */
export function openSecret(sealed: Buffer, caseId: string, seedKey: string): Secret {
  const nonce = sealed.subarray(0, NONCE_BYTES);
  const tag = sealed.subarray(NONCE_BYTES, NONCE_BYTES + TAG_BYTES);
  const decipher = createDecipheriv(ALGORITHM, keyBytes(seedKey), nonce, { authTagLength: TAG_BYTES });
  decipher.setAAD(Buffer.from(caseId)).setAuthTag(tag);
  const text = Buffer.concat([decipher.update(sealed.subarray(NONCE_BYTES + TAG_BYTES)), decipher.final()]);
  return JSON.parse(text.toString("utf8")) as Secret;
}

const keyBytes = (seedKey: string) => Buffer.from(seedKey, "base64url");
