import fs from "node:fs";
import path from "node:path";
import { fingerprint } from "./fingerprint.mjs";
import { mustRun } from "./run.mjs";
import { Refusal, say } from "./say.mjs";

/**
 * `npm ci`, only when the lock file is not the one that was installed last.
 * @param inUse true while another command runs on these packages: they must not be replaced under it
 */
export async function installPackages(root, inUse) {
  const mark = path.join(root, ".data", "packages");
  const wanted = fingerprint(root, ["package-lock.json"], [process.version, process.arch]);
  // npm writes this file last, so an interrupted installation has none.
  const complete = fs.existsSync(path.join(root, "node_modules", ".package-lock.json"));
  if (complete && fs.existsSync(mark) && fs.readFileSync(mark, "utf8") === wanted) return;
  if (inUse)
    throw new Refusal("package-lock.json has changed, but npm start is running on the packages. Stop it first.");
  say("Installing packages (npm ci) ...");
  fs.rmSync(mark, { force: true });
  await mustRun("npm ci", "npm", ["ci", "--include=dev", "--no-audit", "--no-fund"], { cwd: root });
  fs.mkdirSync(path.dirname(mark), { recursive: true });
  fs.writeFileSync(mark, wanted);
}
