import { spawnSync } from "node:child_process";
import { randomBytes } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import { freePort } from "../setup/ports.mjs";
import { lastLines } from "../setup/run.mjs";
import { Refusal } from "../setup/say.mjs";
import { serverAccount } from "./serverAccount.mjs";

export const SUPERUSER = "lagmark_cluster";

/**
 * Starts the server of a folder on loopback, without a socket; nothing happens when it already runs.
 * @param durable false: for data that may be lost, and is written faster
 */
export async function startServer(bin, folder, durable) {
  fs.mkdirSync(folder, { recursive: true });
  fs.chmodSync(folder, 0o755);
  const at = paths(folder);
  const account = serverAccount(folder, at.data);
  if (!fs.existsSync(path.join(at.data, "PG_VERSION"))) createDataFolder(bin, at, account);
  if (isRunning(at.data)) return;
  // Left by a killed machine: a live server of this folder was looked for above.
  fs.rmSync(path.join(at.data, "postmaster.pid"), { force: true });
  for (let tries = 1; ; tries += 1) {
    const port = await freePort(fs.existsSync(at.port) ? Number(fs.readFileSync(at.port, "utf8")) : 0);
    fs.writeFileSync(at.port, String(port));
    const settings = [
      "listen_addresses=127.0.0.1",
      `port=${port}`,
      "unix_socket_directories=",
      "timezone=UTC",
      // A failing statement would be logged with the values in it.
      "log_min_error_statement=panic",
      ...(durable ? [] : ["fsync=off", "full_page_writes=off", "synchronous_commit=off"]),
    ];
    const options = settings.map((setting) => `-c ${setting}`).join(" ");
    const args = ["-D", at.data, "-l", at.log, "-w", "-t", "60", "-o", options, "start"];
    if (asServer(account, at, [path.join(bin, "pg_ctl"), ...args]) === 0) return;
    if (tries === 3) throw new Refusal(`PostgreSQL does not start:\n${lastLines(fs.readFileSync(at.log, "utf8"), 20)}`);
    fs.rmSync(at.port, { force: true });
  }
}

export function stopServer(bin, folder) {
  const at = paths(folder);
  if (!isRunning(at.data)) return;
  const account = serverAccount(folder, at.data);
  asServer(account, at, [path.join(bin, "pg_ctl"), "-D", at.data, "-m", "fast", "-w", "-t", "60", "stop"]);
}

/** A live server of this very folder? A process number alone may be a zombie's or, by now, somebody else's. */
export function isRunning(data) {
  try {
    const pid = fs.readFileSync(path.join(data, "postmaster.pid"), "utf8").split("\n")[0].trim();
    return fs.readFileSync(`/proc/${pid}/cmdline`, "utf8").split("\0").includes(data);
  } catch {
    return false;
  }
}

export function paths(folder) {
  const inside = (name) => path.join(folder, name);
  return {
    data: inside("data"),
    log: inside("log"),
    port: inside("port"),
    password: inside("password"),
    calls: inside("calls.log"),
  };
}

function createDataFolder(bin, at, account) {
  fs.rmSync(at.data, { recursive: true, force: true });
  fs.mkdirSync(at.data, { mode: 0o700 });
  fs.writeFileSync(at.password, randomBytes(18).toString("base64url"), { mode: 0o600 });
  fs.writeFileSync(at.log, "", { mode: 0o600 });
  if (account.owner) {
    for (const file of [at.data, at.log, at.password]) fs.chownSync(file, account.owner.uid, account.owner.gid);
  }
  const rules = ["-E", "UTF8", "--locale=C.UTF-8", "--auth=scram-sha-256", `--pwfile=${at.password}`, "--no-sync"];
  if (asServer(account, at, [path.join(bin, "initdb"), "-D", at.data, "-U", SUPERUSER, ...rules]) !== 0) {
    fs.rmSync(at.data, { recursive: true, force: true });
    throw new Refusal(`PostgreSQL cannot create its data folder:\n${lastLines(fs.readFileSync(at.calls, "utf8"), 20)}`);
  }
}

/** Output goes to a file: a server that inherits a pipe keeps the caller waiting for ever. */
function asServer({ prefix }, at, command) {
  const calls = fs.openSync(at.calls, "a", 0o600);
  const [program, ...args] = [...prefix, ...command];
  const { status } = spawnSync(program, args, { cwd: "/", stdio: ["ignore", calls, calls] });
  fs.closeSync(calls);
  return status;
}
