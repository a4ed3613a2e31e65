import fs from "node:fs";
import path from "node:path";
import { startCluster } from "./cluster.mjs";
import { buildApplication } from "./setup/buildApplication.mjs";
import { checkNode } from "./setup/checkNode.mjs";
import { claimFolder, isClaimed } from "./setup/claimFolder.mjs";
import * as demonstration from "./setup/demonstration.mjs";
import { installPackages } from "./setup/installPackages.mjs";
import { installTools, programPath } from "./setup/installTools.mjs";
import { freePort } from "./setup/ports.mjs";
import { migrate, prepareDatabase, prepareJobs } from "./setup/prepareDatabase.mjs";
import { Processes } from "./setup/Processes.mjs";
import { processSettings } from "./setup/processSettings.mjs";
import { Refusal, say } from "./setup/say.mjs";
import { onStop, stop, stopOnSignals } from "./setup/shutdown.mjs";
import { bin, Tally } from "./setup/Tally.mjs";
import { waitForAnswer } from "./setup/waitForAnswer.mjs";

const root = path.resolve(import.meta.dirname, "..");
// Nothing of a running `npm start` is touched: another cluster, another build folder, other ports.
const home = path.join(root, ".data", "test");
const logs = path.join(home, "log");
const DIST_DIR = ".next-test";
const PARTS = ["checks", "unit", "rules", "database", "browser"];

/** `npm test`: everything on a fresh database; the last line is "N passed, N failed". */
async function test(parts) {
  const tally = new Tally(root, logs);
  let cluster = null;
  let note = null;
  const ready = await tally.step("set-up", async () => {
    checkNode();
    note = await claimFolder(home, "npm test");
    await installPackages(root, isClaimed(path.join(root, ".data")));
    if (parts.some((part) => ["unit", "database", "browser"].includes(part))) await installTools();
    if (parts.some((part) => ["database", "browser"].includes(part))) {
      cluster = await startCluster(path.join(home, "pg"), { durable: false });
      onStop(() => cluster.stop());
    }
  });
  if (ready) {
    // The build keeps both cores busy; the browser and the database tests wait more than they compute.
    const built = parts.includes("browser") ? build(tally) : Promise.resolve(false);
    await Promise.all([
      built.then((done) => done && browserLane(tally, cluster, note)),
      built.then(() => parts.includes("database") && databaseLane(tally, cluster)),
      sourcesLane(tally, parts, built),
    ]);
  }
  await stop(tally.failed > 0 ? 1 : 0, `${tally.passed} passed, ${tally.failed} failed`);
}

async function sourcesLane(tally, parts, built) {
  if (parts.includes("checks")) {
    await tally.command("format", [bin("prettier", "bin/prettier.cjs"), "--check", "."], process.env);
    await tally.command("lint", [bin("eslint", "bin/eslint.js"), ".", "--max-warnings=0"], process.env);
  }
  if (parts.includes("rules")) await tally.tests("rules", testSettings({}));
  if (parts.includes("unit")) await tally.tests("unit", testSettings({}));
  if (parts.includes("checks")) {
    // The build writes the types of the routes; without one they are made for this step.
    if (!(await built)) await tally.command("route types", [NEXT, "typegen"], buildSettings());
    await tally.command("types", [bin("typescript", "bin/tsc"), "--noEmit"], process.env);
  }
}

async function databaseLane(tally, cluster) {
  const settings = await freshSettings(cluster, "lagmark_tests", await freePort());
  const env = { ...process.env, ...settings, NODE_ENV: "test" };
  const migrated = await tally.step("migrations up, down and up again", async () => {
    for (const step of ["db:migrate", "db:migrate:undo:all", "db:migrate"]) await migrate(root, env, step);
    await prepareJobs(root, env);
    await demonstration.makeIssuerKey(root, settings);
  });
  if (migrated) await tally.tests("database", testSettings(settings));
}

const build = (tally) =>
  tally.step("build", () =>
    buildApplication(root, { distDir: DIST_DIR, env: buildSettings(), log: path.join(logs, "build.log") }),
  );

async function browserLane(tally, cluster, note) {
  const port = await freePort();
  const origin = `http://127.0.0.1:${port}`;
  const own = path.join(home, "lagmark_browser");
  let settings = null;
  const running = await tally.step("start", async () => {
    settings = await freshSettings(cluster, "lagmark_browser", port);
    const env = { ...process.env, ...settings, PORT: String(port), NODE_ENV: "production", NEXT_DIST_DIR: DIST_DIR };
    await prepareDatabase(root, env);
    await demonstration.makeIssuerKey(root, settings);
    const mark = path.join(own, "demo-seeded");
    await demonstration.seedDemonstration(root, mark, env, path.join(logs, "seed.log"));
    const processes = new Processes(root, logs, note, { onEnd: (reason) => tally.fail("running product", reason) });
    demonstration.startStandIns(processes, own, settings, process.env);
    processes.start("worker", [...demonstration.TYPESCRIPT, "lib/worker/main.ts"], processSettings("worker", env));
    const next = [NEXT, "start", "-H", "127.0.0.1", "-p", String(port)];
    processes.start("web", next, processSettings("web", env));
    await waitForAnswer(`${origin}/`, 300);
  });
  const chromium = programPath("chromium") ?? "";
  if (running) await tally.tests("browser", testSettings({ ...settings, CHROMIUM_PATH: chromium }));
}

const NEXT = bin("next", "dist/bin/next");

/** Settings over an empty database; files of an earlier run are gone as well. */
async function freshSettings(cluster, database, port) {
  const own = path.join(home, database);
  fs.rmSync(own, { recursive: true, force: true });
  await cluster.dropDatabase(database);
  await cluster.createDatabase(database);
  return demonstration.demonstrationSettings(own, cluster.urls(database), `http://127.0.0.1:${port}`);
}

// The database of an installation that this shell happens to name must not reach the tests.
const NO_DATABASE = { OWNER_DATABASE_URL: "", DATABASE_URL: "", WORKER_DATABASE_URL: "" };
const testSettings = (settings) => ({ ...process.env, ...NO_DATABASE, ...settings, NODE_ENV: "test" });
const buildSettings = () =>
  processSettings("build", { ...process.env, NODE_ENV: "production", NEXT_DIST_DIR: DIST_DIR });

function wantedParts(args) {
  const only = args[args.indexOf("--only") + 1];
  if (!args.includes("--only")) return PARTS;
  if (!PARTS.includes(only)) throw new Refusal(`--only takes one of ${PARTS.join(", ")}`);
  return [only];
}

stopOnSignals();
Promise.resolve()
  .then(() => test(wantedParts(process.argv.slice(2))))
  .catch((error) => {
    say(error instanceof Refusal ? error.message : error.stack);
    return stop(1, "0 passed, 1 failed");
  });
