// node --import ./scripts/register.mjs scripts/make-issuer-key.ts FOLDER [--demonstration] [--organisation NAME] [--country XX]
// Makes a root and an issuer key under it. Take root-key.pem off the machine afterwards; only a new issuer key needs it.
import fs from "node:fs";
import path from "node:path";
import { parseArgs } from "node:util";
import { makeIssuerKey } from "@/lib/certificates/makeIssuerKey";

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: {
    demonstration: { type: "boolean", default: false },
    organisation: { type: "string", default: "Lagmark" },
    country: { type: "string" },
  },
});
const [folder, ...rest] = positionals;
if (!folder || rest.length > 0 || (values.country && !/^[A-Z]{2}$/.test(values.country))) {
  process.stderr.write("make-issuer-key FOLDER [--demonstration] [--organisation NAME] [--country XX]\n");
  process.exit(1);
}
if (fs.existsSync(path.join(folder, "key.pem"))) {
  process.stderr.write(
    `${path.join(folder, "key.pem")} exists: certificates may have been signed with it, so it stays.\n`,
  );
  process.exit(1);
}

const made = await makeIssuerKey({ ...values, from: new Date() });
fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
const write = (name: string, text: string, mode: number) => fs.writeFileSync(path.join(folder, name), text, { mode });
write("root-key.pem", made.rootKeyPem, 0o600);
write("root.pem", made.rootPem, 0o644);
write("certificate.pem", made.certificatePem, 0o644);
// Last: whoever looks whether the key is there finds all of it or nothing.
write("key.pem", made.keyPem, 0o600);
