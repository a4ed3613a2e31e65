import { spawn } from "node:child_process";
import fs from "node:fs";
import path from "node:path";
import { setTimeout as wait } from "node:timers/promises";
import { signalGroup } from "./claimFolder.mjs";
import { lastLines } from "./run.mjs";
import { say } from "./say.mjs";
import { isStopping, onStop, stop } from "./shutdown.mjs";

const GRACE_MS = 10_000;
const LONGEST_PAUSE_S = 30;

/** Starts the long-running processes, each with a log file, and ends them in the opposite order. */
export class Processes {
  #root;
  #logs;
  #note;
  #echo;
  #onEnd;

  /**
   * @param note is told each process number
   * @param echo true repeats every log line on the terminal
   * @param onEnd is called with the reason when a process ends that should not
   */
  constructor(root, logs, note, { echo = false, onEnd = stopEverything } = {}) {
    [this.#root, this.#logs, this.#note, this.#echo, this.#onEnd] = [root, logs, note, echo, onEnd];
    fs.mkdirSync(logs, { recursive: true, mode: 0o700 });
  }

  /** @param again true: when it ends by itself it is started again */
  start(name, args, env, { again = false } = {}) {
    const log = path.join(this.#logs, `${name}.log`);
    const running = { child: null, crashes: 0 };
    const launch = () => {
      const started = Date.now();
      const file = fs.openSync(log, running.child ? "a" : "w", 0o600);
      const stdio = ["ignore", this.#echo ? "pipe" : file, this.#echo ? "pipe" : file];
      const child = spawn(process.execPath, args, { cwd: this.#root, env, stdio, detached: true });
      running.child = child;
      if (this.#echo) for (const stream of [child.stdout, child.stderr]) repeat(stream, name, file);
      if (child.pid) this.#note(child.pid);
      child.on("close", async (code, signal) => {
        fs.closeSync(file);
        if (isStopping()) return;
        const how = `${name} ended (${signal ?? `exit ${code}`}); its log: ${path.relative(this.#root, log)}`;
        if (!again) return this.#onEnd(`${how}\n${lastLines(fs.readFileSync(log, "utf8"), 30)}`);
        running.crashes = Date.now() - started > 60_000 ? 1 : running.crashes + 1;
        const pauseS = Math.min(2 ** (running.crashes - 1), LONGEST_PAUSE_S);
        say(`${how}. Starting it again in ${pauseS} s.`);
        await wait(pauseS * 1000);
        if (!isStopping()) launch();
      });
    };
    launch();
    onStop(() => end(running.child));
  }
}

function stopEverything(reason) {
  say(reason);
  void stop(1);
}

async function end(child) {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const ended = new Promise((resolve) => child.once("exit", resolve));
  signalGroup(child.pid, "SIGTERM");
  const timer = setTimeout(() => signalGroup(child.pid, "SIGKILL"), GRACE_MS);
  await ended;
  clearTimeout(timer);
}

function repeat(stream, name, file) {
  stream.setEncoding("utf8").on("data", (chunk) => {
    fs.writeSync(file, chunk);
    for (const line of chunk.trimEnd().split("\n")) say(`${name.padEnd(7)}| ${line}`);
  });
}
