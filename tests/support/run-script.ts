import { type ChildProcess, spawn } from "node:child_process";
import path from "node:path";

export type RunningScript = { origin: string; output: () => string; stop: () => Promise<void> };

/** Starts one of scripts/ as its own process and waits until it says where it listens. */
export async function runScript(script: string, settings: Record<string, string>): Promise<RunningScript> {
  const root = path.resolve(import.meta.dirname, "../..");
  const child = spawn(process.execPath, [script], { cwd: root, env: { ...process.env, ...settings } });
  let output = "";
  const origin = await new Promise<string>((resolve, reject) => {
    const read = (chunk: Buffer) => {
      output += chunk.toString();
      const found = output.match(/listening on (\S+)/);
      if (found) resolve(found[1]);
    };
    child.stdout.on("data", read);
    child.stderr.on("data", read);
    child.once("exit", (code) => reject(new Error(`${script} ended with ${code}:\n${output}`)));
  });
  return { origin, output: () => output, stop: () => stopChild(child) };
}

function stopChild(child: ChildProcess): Promise<void> {
  return new Promise((resolve) => {
    child.once("exit", () => resolve());
    child.kill("SIGTERM");
  });
}
