import { createPublicKey, generateKeyPairSync } from "node:crypto";
import { decodeProtectedHeader, UnsecuredJWT } from "jose";
import { beforeAll, expect, test } from "vitest";
import { publicJwk, readHead, signHead } from "@/lib/trail/head";

const keyPem = () =>
  generateKeyPairSync("ec", { namedCurve: "P-256" }).privateKey.export({ type: "pkcs8", format: "pem" }) as string;
const HEAD = { sequence: "12", link: "ab".repeat(32), at: "2026-12-01T10:00:00.000Z" };

let issuer: string;
let signature: string;
beforeAll(async () => {
  issuer = keyPem();
  signature = await signHead(HEAD, issuer);
});

test("whoever has the public key reads the head back", async () => {
  expect(await readHead(signature, createPublicKey(issuer))).toEqual(HEAD);
});

test("is a compact ES256 signature that names its key", () => {
  expect(decodeProtectedHeader(signature)).toMatchObject({ alg: "ES256", kid: expect.stringMatching(/^[\w-]{43}$/) });
});

test("another key does not read it", async () => {
  expect(await readHead(signature, createPublicKey(keyPem()))).toBeNull();
});

test("a head changed after signing is not read", async () => {
  const [header, , mark] = signature.split(".");
  const other = Buffer.from(JSON.stringify({ ...HEAD, sequence: "13" })).toString("base64url");
  expect(await readHead([header, other, mark].join("."), createPublicKey(issuer))).toBeNull();
});

test("an unsigned head is not read", async () => {
  const unsigned = new UnsecuredJWT({ ...HEAD }).encode();
  expect(await readHead(unsigned, createPublicKey(issuer))).toBeNull();
});

test("the published key has no private part", () => {
  expect(Object.keys(publicJwk(issuer)).sort()).toEqual(["crv", "kty", "x", "y"]);
});
