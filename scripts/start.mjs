import fs from "node:fs";
import path from "node:path";
import { startCluster } from "./cluster.mjs";
import { buildApplication } from "./setup/buildApplication.mjs";
import { checkNode } from "./setup/checkNode.mjs";
import { claimFolder, isClaimed } from "./setup/claimFolder.mjs";
import * as demonstration from "./setup/demonstration.mjs";
import { installPackages } from "./setup/installPackages.mjs";
import { isPortFree } from "./setup/ports.mjs";
import { prepareDatabase } from "./setup/prepareDatabase.mjs";
import { Processes } from "./setup/Processes.mjs";
import { processSettings } from "./setup/processSettings.mjs";
import { mustRun } from "./setup/run.mjs";
import { Refusal, say } from "./setup/say.mjs";
import { onStop, stop, stopOnSignals } from "./setup/shutdown.mjs";
import { waitForAnswer } from "./setup/waitForAnswer.mjs";

const root = path.resolve(import.meta.dirname, "..");
const home = path.join(root, ".data");
const developing = process.argv.includes("--dev");

/** `npm start` and, with --dev, `npm run dev`: everything a fresh machine needs, then the running product. */
async function start() {
  const begun = Date.now();
  checkNode();
  if (fs.existsSync(path.join(root, ".env"))) process.loadEnvFile(path.join(root, ".env"));
  const port = wantedPort();
  const note = await claimFolder(home, developing ? "npm run dev" : "npm start");
  if (!(await isPortFree(port))) {
    throw new Refusal(
      `Port ${port} is taken by another program. Stop it, or choose another: PORT=${port + 1} npm start`,
    );
  }
  await installPackages(root, isClaimed(path.join(home, "test")));

  // A database named from outside means real services: then nothing is made up here.
  const demonstrating = !process.env.DATABASE_URL;
  const settings = demonstrating ? await demonstrate(port) : await outsideSettings();
  const env = { ...process.env, ...settings, PORT: String(port), NODE_ENV: developing ? "development" : "production" };
  const logs = path.join(home, "log");
  if (!developing) {
    const build = { distDir: ".next", env: processSettings("build", env), log: path.join(logs, "build.log") };
    await buildApplication(root, build);
  }
  say("Preparing the database ...");
  await prepareDatabase(root, env);

  const processes = new Processes(root, logs, note, { echo: developing });
  if (demonstrating) {
    await demonstration.makeIssuerKey(root, settings);
    const mark = path.join(home, "pg", "demo-seeded");
    await demonstration.seedDemonstration(root, mark, env, path.join(logs, "seed.log"));
    demonstration.startStandIns(processes, home, settings, process.env);
  }
  const watch = developing ? ["--watch"] : [];
  const worker = [...watch, ...demonstration.TYPESCRIPT, "lib/worker/main.ts"];
  processes.start("worker", worker, processSettings("worker", env), { again: true });
  const next = ["node_modules/next/dist/bin/next", developing ? "dev" : "start", "-H", "127.0.0.1", "-p", String(port)];
  processes.start("web", next, processSettings("web", env));
  await waitForAnswer(`http://127.0.0.1:${port}/`, 300);
  announce(settings, (Date.now() - begun) / 1000);
}

async function demonstrate(port) {
  say("Starting PostgreSQL ...");
  const cluster = await startCluster(path.join(home, "pg"));
  onStop(() => cluster.stop());
  await cluster.createDatabase("lagmark");
  const origin = process.env.PUBLIC_ORIGIN || `http://127.0.0.1:${port}`;
  return demonstration.demonstrationSettings(home, cluster.urls("lagmark"), origin);
}

/** Nothing starts half-configured: what is missing or wrong is told as one list. */
async function outsideSettings() {
  await mustRun("The settings", "node", [...demonstration.TYPESCRIPT, "scripts/check-settings.ts"], { cwd: root });
  return { DEMONSTRATION: "", PUBLIC_ORIGIN: process.env.PUBLIC_ORIGIN };
}

function wantedPort() {
  const text = process.env.PORT || "3000";
  const port = Number(text);
  if (!/^\d+$/.test(text) || port < 1 || port > 65535) throw new Refusal(`PORT is not a port number: ${text}`);
  return port;
}

function announce(settings, seconds) {
  say(`\nLagmark is ready after ${seconds.toFixed(1)} s: ${settings.PUBLIC_ORIGIN}`);
  if (settings.DEMONSTRATION_MAIL_URL) say(`Mails of the demonstration: ${settings.DEMONSTRATION_MAIL_URL}`);
  const people = settings.DEMO_SIGN_INS_FILE && readSignIns(settings.DEMO_SIGN_INS_FILE);
  if (people) {
    say("Sign in as:");
    for (const { role, name, email, password } of people) {
      say(`  ${role.padEnd(16)} ${name.padEnd(22)} ${email.padEnd(34)} ${password}`);
    }
  }
  say("Ctrl-C stops all of it.");
}

const readSignIns = (file) => (fs.existsSync(file) ? JSON.parse(fs.readFileSync(file, "utf8")) : null);

stopOnSignals();
start().catch((error) => {
  say(error instanceof Refusal ? `\n${error.message}` : `\n${error.stack}`);
  return stop(1);
});
