import { spawnSync } from "node:child_process";
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { afterEach, beforeEach, expect, test, vi } from "vitest";

vi.setConfig({ testTimeout: 60_000 });

// Like the real one it removes the earlier build before it knows whether the new one will succeed.
const BUILDER = `
  const fs = require("node:fs");
  fs.rmSync(".next/page", { force: true });
  fs.mkdirSync(".next/cache", { recursive: true });
  fs.appendFileSync(".next/cache/runs", "x");
  const source = fs.readFileSync("app/page", "utf8");
  if (source.includes("broken")) { console.log("line 3 is broken"); process.exit(1); }
  fs.writeFileSync(".next/page", "built from " + source);
`;
const command = pathToFileURL(path.resolve(import.meta.dirname, "../../scripts/setup/buildApplication.mjs")).href;
let root: string;

beforeEach(() => {
  root = mkdtempSync(path.join(tmpdir(), "build-"));
  write("node_modules/next/dist/bin/next", BUILDER);
  write("app/page", "one");
});
afterEach(() => rmSync(root, { recursive: true }));

function write(name: string, text: string) {
  mkdirSync(path.dirname(path.join(root, name)), { recursive: true });
  writeFileSync(path.join(root, name), text);
}
const read = (name: string) => readFileSync(path.join(root, name), "utf8");
const runs = () => read(".next/cache/runs").length;

function build() {
  const options = JSON.stringify({ distDir: ".next", log: path.join(root, "build.log") });
  const program =
    `import { buildApplication } from ${JSON.stringify(command)};` +
    `await buildApplication(${JSON.stringify(root)}, { ...${options}, env: process.env }).catch((error) => {` +
    `console.log(error.message); process.exit(1); });`;
  const { status, stdout } = spawnSync(process.execPath, ["--input-type=module", "-e", program], { encoding: "utf8" });
  return { status, stdout };
}

test("builds once, and again only when a source or a setting of the build has changed", () => {
  build();
  expect(build()).toEqual({ status: 0, stdout: "" });
  expect(runs()).toBe(1);
  write("tests/page.test.ts", "no part of the application");
  build();
  expect(runs()).toBe(1);
  write("app/page", "two");
  build();
  write("next.config.mjs", "export default {}");
  build();
  expect(runs()).toBe(3);
  expect(read(".next/page")).toBe("built from two");
});

test("a source that went away is a change", () => {
  write("lib/a", "a");
  build();
  rmSync(path.join(root, "lib/a"));
  build();
  expect(runs()).toBe(2);
});

test("a failed build is told with its reason, keeps the earlier one and is tried again", () => {
  build();
  write("app/page", "broken");
  const failed = build();
  expect(failed.status).toBe(1);
  expect(failed.stdout).toContain("line 3 is broken");
  expect(read(".next/page")).toBe("built from one");
  write("app/page", "one");
  expect(build()).toEqual({ status: 0, stdout: "" });
  expect(runs()).toBe(2);
});

test("a build that was killed half-way leaves the earlier one to come back to", () => {
  build();
  mkdirSync(path.join(root, ".next-kept"));
  for (const name of ["page", "built-from"]) writeFileSync(path.join(root, ".next-kept", name), read(`.next/${name}`));
  rmSync(path.join(root, ".next/page"));
  expect(build()).toEqual({ status: 0, stdout: "" });
  expect(read(".next/page")).toBe("built from one");
  expect(existsSync(path.join(root, ".next-kept"))).toBe(false);
});
