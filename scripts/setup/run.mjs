import { spawn } from "node:child_process";
import fs from "node:fs";
import path from "node:path";
import { stripVTControlCharacters } from "node:util";
import { Refusal } from "./say.mjs";
import { onStop } from "./shutdown.mjs";

const KEPT_CHARACTERS = 200_000;

/**
 * Runs one command to its end, without a shell. Output goes to the log file, or comes back as text, or both.
 * @returns {Promise<{ code: number, output: string }>} output holds the last part of stdout and stderr together
 */
export function run(command, args, { env = process.env, cwd, log, input } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { env, cwd, stdio: [input === undefined ? "ignore" : "pipe", "pipe", "pipe"] });
    const closed = new Promise((done) => child.once("close", done));
    // Waits: what is undone after this would otherwise race with the last writes of the command.
    const forget = onStop(() => child.kill() && closed);
    if (log) fs.mkdirSync(path.dirname(log), { recursive: true });
    const file = log ? fs.openSync(log, "w", 0o600) : null;
    let output = "";
    const keep = (chunk) => {
      output = (output + chunk).slice(-KEPT_CHARACTERS);
      if (file !== null) fs.writeSync(file, chunk);
    };
    child.stdout.setEncoding("utf8").on("data", keep);
    child.stderr.setEncoding("utf8").on("data", keep);
    child.on("error", reject);
    child.on("close", (code, signal) => {
      if (signal) keep(`\n${path.basename(command)} was ended by ${signal}.\n`);
      forget();
      if (file !== null) fs.closeSync(file);
      resolve({ code: code ?? 1, output: stripVTControlCharacters(output) });
    });
    if (input !== undefined) child.stdin.end(input);
  });
}

/** Runs one command that must succeed; the end of its output is the reason otherwise. */
export async function mustRun(what, command, args, options) {
  const { code, output } = await run(command, args, options);
  if (code !== 0) throw new Refusal(`${what} failed (exit ${code}):\n${lastLines(output, 40)}`);
  return output;
}

export const lastLines = (text, count) => text.trimEnd().split("\n").slice(-count).join("\n");
