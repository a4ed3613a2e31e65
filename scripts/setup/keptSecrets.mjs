import { randomBytes } from "node:crypto";
import fs from "node:fs";
import path from "node:path";

/** Secrets of a demonstration: drawn once, then the same at every start, readable by this account alone. */
export function keptSecrets(folder) {
  const file = path.join(folder, "secrets.json");
  if (fs.existsSync(file)) return JSON.parse(fs.readFileSync(file, "utf8"));
  const secrets = {
    NEXTAUTH_SECRET: randomBytes(32).toString("base64url"),
    SEED_KEY: randomBytes(32).toString("base64url"),
    STRIPE_SECRET_KEY: `sk_test_${randomBytes(18).toString("hex")}`,
    STRIPE_WEBHOOK_SECRET: `whsec_${randomBytes(24).toString("hex")}`,
  };
  fs.mkdirSync(folder, { recursive: true });
  fs.writeFileSync(file, JSON.stringify(secrets), { mode: 0o600 });
  return secrets;
}

/** Ports of the local stand-ins: kept where possible, so that addresses in stored pages and mails stay good. */
export function keptPorts(folder) {
  const file = path.join(folder, "ports.json");
  return {
    read: () => (fs.existsSync(file) ? JSON.parse(fs.readFileSync(file, "utf8")) : {}),
    write: (ports) => {
      fs.mkdirSync(folder, { recursive: true });
      fs.writeFileSync(file, JSON.stringify(ports));
    },
  };
}
