import fs from "node:fs";
import path from "node:path";
import { setTimeout as wait } from "node:timers/promises";
import { isAlive, processIdentity } from "./processIdentity.mjs";
import { Refusal } from "./say.mjs";
import { onStop } from "./shutdown.mjs";

/**
 * One command at a time works in a state folder. A second one is refused while the first lives; what a killed one
 * left running is ended first.
 * @returns a function that notes a started process, so that the next command can find it
 */
export async function claimFolder(folder, what) {
  fs.mkdirSync(folder, { recursive: true });
  const file = path.join(folder, "running.json");
  const earlier = readEarlier(file);
  if (earlier && isAlive(earlier.owner)) {
    throw new Refusal(
      `${earlier.what} is already running in this folder (process ${earlier.owner.pid}). Stop it first.`,
    );
  }
  await endLeftBehind(earlier?.started ?? []);
  const claim = { what, owner: processIdentity(process.pid), started: [] };
  const write = () => fs.writeFileSync(file, JSON.stringify(claim));
  write();
  onStop(() => fs.rmSync(file, { force: true }));
  return (pid) => {
    const identity = processIdentity(pid);
    claim.started = [...claim.started.filter(isAlive), ...(identity ? [identity] : [])];
    write();
  };
}

/** Is `npm start` using this project at the moment? */
export function isClaimed(folder) {
  const earlier = readEarlier(path.join(folder, "running.json"));
  return earlier !== null && isAlive(earlier.owner);
}

function readEarlier(file) {
  try {
    return JSON.parse(fs.readFileSync(file, "utf8"));
  } catch {
    return null;
  }
}

async function endLeftBehind(identities) {
  for (const signal of ["SIGTERM", "SIGKILL"]) {
    const alive = identities.filter(isAlive);
    for (const { pid } of alive) signalGroup(pid, signal);
    for (let tries = 0; tries < 30 && alive.some(isAlive); tries += 1) await wait(100);
  }
}

/** Every process is started as the leader of a group of its own; what it started belongs to the group. */
export function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch (error) {
    if (error.code !== "ESRCH") throw error;
  }
}
