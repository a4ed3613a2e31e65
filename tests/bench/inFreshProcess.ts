import { spawnSync } from "node:child_process";
import path from "node:path";
import { pathToFileURL } from "node:url";

/** Loads a module of this folder in a fresh process, calls one of its functions and reads the peak of its resident memory. */
export function inFreshProcess<T>(module: string, name: string, ...args: unknown[]): { value: T; megabytes: number } {
  const address = pathToFileURL(path.resolve(import.meta.dirname, module)).href;
  const call = `
    const { ${name} } = await import(${JSON.stringify(address)});
    const value = await ${name}(...${JSON.stringify(args)});
    const megabytes = process.resourceUsage().maxRSS / 1024;
    process.stdout.write(JSON.stringify({ value, megabytes }));
  `;
  const root = path.resolve(import.meta.dirname, "../..");
  const flags = ["--import", "./scripts/register.mjs", "--input-type=module", "--eval"];
  const run = spawnSync(process.execPath, [...flags, call], { encoding: "utf8", cwd: root });
  if (run.status !== 0) throw new Error(run.stderr);
  return JSON.parse(run.stdout);
}
