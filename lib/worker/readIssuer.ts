import "server-only";
import { readFileSync } from "node:fs";
import type { IssuerKey } from "@/lib/certificates/signPdf";

type Files = { ISSUER_KEY_FILE: string; ISSUER_CERTIFICATE_FILE: string; ISSUER_ROOT_FILE: string };

const CERTIFICATE = /-----BEGIN CERTIFICATE-----[\s\S]+?-----END CERTIFICATE-----/g;

/** Key and certificates of the issuer. The certificate file may hold the certificates between it and the root as well. */
export function readIssuer(files: Files): { issuerKey: IssuerKey; rootPem: string } {
  const [certificatePem, ...between] = readFileSync(files.ISSUER_CERTIFICATE_FILE, "utf8").match(CERTIFICATE) ?? [];
  if (!certificatePem) throw new Error("readIssuer: ISSUER_CERTIFICATE_FILE holds no certificate");
  const rootPem = readFileSync(files.ISSUER_ROOT_FILE, "utf8");
  const keyPem = readFileSync(files.ISSUER_KEY_FILE, "utf8");
  return { issuerKey: { keyPem, certificatePem, chainPem: [...between, rootPem] }, rootPem };
}
