import fs from "node:fs";
import path from "node:path";
import { fingerprint } from "./fingerprint.mjs";
import { lastLines, run } from "./run.mjs";
import { Refusal, say } from "./say.mjs";
import { onStop } from "./shutdown.mjs";

const SOURCES = ["app", "components", "content", "fonts", "lib", "models", "public"];
const CONFIGURATION = /^(package-lock\.json|tsconfig\.json|[\w.-]+\.(config\.)?(ts|mjs|cjs|js))$/;

/** `next build` into a folder of its own, only when a source file is not the one that was built last. */
export async function buildApplication(root, { distDir, env, log }) {
  const dist = path.join(root, distDir);
  const kept = `${dist}-kept`;
  // A command that was killed while it built left the earlier build aside.
  if (fs.existsSync(kept)) putBack(dist, kept);
  const mark = path.join(dist, "built-from");
  const top = fs.readdirSync(root).filter((name) => CONFIGURATION.test(name) && name !== "next-env.d.ts");
  const wanted = fingerprint(root, [...SOURCES, ...top.sort()], [process.version]);
  if (fs.existsSync(mark) && fs.readFileSync(mark, "utf8") === wanted) return;
  say("Building the application (next build) ...");
  setAside(dist, kept);
  const forget = onStop(() => putBack(dist, kept));
  const { code, output } = await run("node", ["node_modules/next/dist/bin/next", "build"], { cwd: root, env, log });
  forget();
  if (code !== 0) {
    putBack(dist, kept);
    throw new Refusal(`The build failed; the earlier build, if any, is kept.\n${lastLines(output, 60)}`);
  }
  fs.writeFileSync(mark, wanted);
  fs.rmSync(kept, { recursive: true, force: true });
}

/** A failed build would remove the earlier one; its cache moves along, for speed. */
function setAside(dist, kept) {
  if (!fs.existsSync(path.join(dist, "built-from"))) return;
  fs.renameSync(dist, kept);
  move(path.join(kept, "cache"), path.join(dist, "cache"));
}

function putBack(dist, kept) {
  if (!fs.existsSync(kept)) return;
  move(path.join(dist, "cache"), path.join(kept, "cache"));
  fs.rmSync(dist, { recursive: true, force: true });
  fs.renameSync(kept, dist);
}

function move(from, to) {
  if (!fs.existsSync(from)) return;
  fs.mkdirSync(path.dirname(to), { recursive: true });
  fs.rmSync(to, { recursive: true, force: true });
  fs.renameSync(from, to);
}
