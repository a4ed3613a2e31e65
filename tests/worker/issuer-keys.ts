import { generateKeyPairSync } from "node:crypto";
import { makeIssuerKey } from "@/lib/certificates/makeIssuerKey";
import { NOW } from "../support/clock";

/** A P-256 key in PEM, as ISSUER_KEY_FILE holds one. */
export const freshKeyPem = (): string =>
  generateKeyPairSync("ec", { namedCurve: "P-256" }).privateKey.export({ type: "pkcs8", format: "pem" }) as string;

/** The whole set: root, issuer certificate and key. */
export const freshIssuer = () => makeIssuerKey({ organisation: "Test register", demonstration: false, from: NOW });
