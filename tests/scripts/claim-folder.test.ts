import { type ChildProcess, spawn } from "node:child_process";
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { afterEach, beforeEach, expect, test, vi } from "vitest";

vi.setConfig({ testTimeout: 60_000 });

const setup = (name: string) => pathToFileURL(path.resolve(import.meta.dirname, "../../scripts/setup", name)).href;
const PROGRAM = `
  import { spawn } from "node:child_process";
  import { claimFolder } from ${JSON.stringify(setup("claimFolder.mjs"))};
  import { stop, stopOnSignals } from ${JSON.stringify(setup("shutdown.mjs"))};
  stopOnSignals();
  try {
    const note = await claimFolder(process.argv[1], "npm start");
    const child = spawn("sleep", ["600"], { detached: true, stdio: "ignore" });
    note(child.pid);
    console.log("claimed, started " + child.pid);
    setInterval(() => {}, 1000);
  } catch (error) {
    console.log(error.message);
    await stop(1);
  }
`;
let folder: string;
const children: ChildProcess[] = [];

beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), "claim-"));
});
afterEach(() => {
  const { started = [] } = JSON.parse(existsSync(file()) ? readFileSync(file(), "utf8") : "{}") as Claim;
  for (const child of children.splice(0)) child.kill("SIGKILL");
  for (const { pid } of started) if (lives(pid)) process.kill(pid, "SIGKILL");
  rmSync(folder, { recursive: true });
});

type Claim = { owner: { pid: number; started: string }; started?: { pid: number }[] };
const file = () => path.join(folder, "running.json");

/** Starts a command that claims the folder. @returns it, and the first line it says */
async function claim() {
  const child = spawn(process.execPath, ["--input-type=module", "-e", PROGRAM, folder]);
  children.push(child);
  const line = await new Promise<string>((resolve) =>
    child.stdout.once("data", (data) => resolve(String(data).trim())),
  );
  return { child, line, started: Number(line.match(/started (\d+)/)?.[1]) };
}
const end = (child: ChildProcess, signal: NodeJS.Signals) =>
  new Promise((resolve) => {
    child.once("exit", resolve);
    child.kill(signal);
  });

/** A killed process that nobody has waited for yet is dead all the same. */
function lives(pid: number): boolean {
  try {
    return !/^\d+ \(.*\) Z/.test(readFileSync(`/proc/${pid}/stat`, "utf8"));
  } catch {
    return false;
  }
}

test("a second command is refused while the first lives, and told which one it is", async () => {
  const first = await claim();
  expect((await claim()).line).toBe(
    `npm start is already running in this folder (process ${first.child.pid}). Stop it first.`,
  );
});

test("after an orderly stop the folder is free", async () => {
  const first = await claim();
  await end(first.child, "SIGTERM");
  expect(existsSync(file())).toBe(false);
  process.kill(first.started, "SIGKILL");
});

test("what a killed command left running is ended before the next one begins", async () => {
  const first = await claim();
  await end(first.child, "SIGKILL");
  expect(lives(first.started)).toBe(true);
  const second = await claim();
  expect(second.line).toMatch(/^claimed/);
  expect(lives(first.started)).toBe(false);
});

test("a number that belongs to another process by now neither refuses nor is ended", async () => {
  const bystander = spawn("sleep", ["600"]);
  children.push(bystander);
  const stranger = { pid: Number(bystander.pid), started: "1" };
  writeFileSync(file(), JSON.stringify({ what: "npm start", owner: stranger, started: [stranger] }));
  expect((await claim()).line).toMatch(/^claimed/);
  expect(lives(stranger.pid)).toBe(true);
});
