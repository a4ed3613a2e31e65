import "server-only";
import { readFile } from "node:fs/promises";
import { webEnv } from "@/lib/env";

/** The issuer's own certificate and the root it leads to: what a file's signature is held against. */
export async function issuerCertificates(): Promise<{ certificatePem: string; rootPem: string }> {
  const { ISSUER_CERTIFICATE_FILE, ISSUER_ROOT_FILE } = webEnv();
  const [certificatePem, rootPem] = await Promise.all([
    readFile(ISSUER_CERTIFICATE_FILE, "utf8"),
    readFile(ISSUER_ROOT_FILE, "utf8"),
  ]);
  return { certificatePem, rootPem };
}
