import fs from "node:fs";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { freePort } from "./ports.mjs";
import { keptPorts, keptSecrets } from "./keptSecrets.mjs";
import { processSettings } from "./processSettings.mjs";
import { mustRun } from "./run.mjs";
import { say } from "./say.mjs";

const WEBHOOK_PATH = "/api/stripe/webhook";

/**
 * Every setting of an installation that needs nobody outside: its own database, secrets drawn here, stand-ins for
 * card payments and mail on this machine.
 * @param databaseUrls the three addresses of the cluster's database
 */
export async function demonstrationSettings(home, databaseUrls, publicOrigin) {
  const ports = keptPorts(home);
  const earlier = ports.read();
  const [card, smtp, mailPage] = [
    await freePort(earlier.card),
    await freePort(earlier.smtp),
    await freePort(earlier.mailPage),
  ];
  ports.write({ card, smtp, mailPage });
  const issuer = (name) => path.join(home, "issuer", name);
  return {
    ...keptSecrets(home),
    ...databaseUrls,
    PUBLIC_ORIGIN: publicOrigin,
    STRIPE_API_URL: `http://127.0.0.1:${card}`,
    SMTP_URL: `smtp://127.0.0.1:${smtp}`,
    MAIL_FROM: "Lagmark demonstration <register@lagmark.example>",
    ISSUER_KEY_FILE: issuer("key.pem"),
    ISSUER_CERTIFICATE_FILE: issuer("certificate.pem"),
    ISSUER_ROOT_FILE: issuer("root.pem"),
    STORAGE_URL: pathToFileURL(path.join(home, "storage")).href,
    DEMONSTRATION: "1",
    DEMONSTRATION_MAIL_URL: `http://127.0.0.1:${mailPage}`,
    DEMO_SIGN_INS_FILE: path.join(home, "demo-sign-ins.json"),
  };
}

/** Starts the stand-ins for the hosted card page and for the mail server. */
export function startStandIns(processes, home, settings, env) {
  const port = (url) => new URL(url).port;
  processes.start("card", ["scripts/fakes/stripe.mjs"], {
    ...env,
    FAKE_PORT: port(settings.STRIPE_API_URL),
    FAKE_STATE: path.join(home, "card.json"),
    FAKE_WEBHOOK_URL: settings.PUBLIC_ORIGIN + WEBHOOK_PATH,
    FAKE_WEBHOOK_SECRET: settings.STRIPE_WEBHOOK_SECRET,
  });
  processes.start("mail", ["scripts/fakes/mail.mjs"], {
    ...env,
    FAKE_PORT: port(settings.DEMONSTRATION_MAIL_URL),
    FAKE_SMTP_PORT: port(settings.SMTP_URL),
    FAKE_FOLDER: path.join(home, "mail"),
  });
}

/** A local issuer key, made once: certificates of a demonstration are signed like any other. */
export async function makeIssuerKey(root, settings) {
  if (fs.existsSync(settings.ISSUER_KEY_FILE)) return;
  say("Making a local issuer key ...");
  const folder = path.dirname(settings.ISSUER_KEY_FILE);
  await mustRun("The issuer key", "node", [...TYPESCRIPT, "scripts/make-issuer-key.ts", folder, "--demonstration"], {
    cwd: root,
  });
}

/** Fills an empty database with the demo firm, once in the life of the database. */
export async function seedDemonstration(root, mark, settings, log) {
  if (fs.existsSync(mark)) return;
  say("Seeding the demo firm ...");
  const run = (script, process) =>
    mustRun("Seeding", "node", [...TYPESCRIPT, script], { cwd: root, env: processSettings(process, settings), log });
  await run("scripts/seed.ts", "web");
  await run("scripts/seed-release-checks.ts", "worker");
  fs.writeFileSync(mark, "");
}

export const TYPESCRIPT = ["--import", "./scripts/register.mjs"];
