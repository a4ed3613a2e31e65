import { createPrivateKey, createPublicKey, type KeyObject } from "node:crypto";
import { CompactSign, calculateJwkThumbprint, compactVerify, type JWK } from "jose";

/** The newest link at an instant. Whoever keeps a signed head can later prove that nothing before it was changed. */
export type TrailHead = { sequence: string; link: string; at: string };

/** Compact JWS, ES256; its `kid` is the thumbprint (RFC 7638) of the issuer's public key. */
export async function signHead(head: TrailHead, keyPem: string): Promise<string> {
  const key = createPrivateKey(keyPem);
  const kid = await calculateJwkThumbprint(publicJwk(keyPem));
  const { sequence, link, at } = head;
  return new CompactSign(new TextEncoder().encode(JSON.stringify({ sequence, link, at })))
    .setProtectedHeader({ alg: "ES256", kid, typ: "lagmark-trail-head+jws" })
    .sign(key);
}

/** @returns null when the signature is not one of this key over a head */
export async function readHead(signature: string, key: KeyObject): Promise<TrailHead | null> {
  try {
    const { payload } = await compactVerify(signature, key, { algorithms: ["ES256"] });
    const { sequence, link, at } = JSON.parse(new TextDecoder().decode(payload)) as TrailHead;
    return { sequence, link, at };
  } catch {
    return null;
  }
}

/** @param pem private key, public key or X.509 certificate */
export const publicJwk = (pem: string): JWK => createPublicKey(pem).export({ format: "jwk" }) as JWK;
