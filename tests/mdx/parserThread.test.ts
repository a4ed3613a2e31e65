import { execFile } from "node:child_process";
import { promisify } from "node:util";
import { expect, test } from "vitest";

const run = promisify(execFile);

/** The thread as a process meets it that was started like this; prints what it made of a text. */
async function readIn(options: string[]) {
  const script = `
    import path from "node:path";
    import { pathToFileURL } from "node:url";
    import { Worker } from "node:worker_threads";
    const worker = new Worker(pathToFileURL(path.resolve("lib/mdx/parserThread.mjs")), { execArgv: [] });
    worker.on("message", ({ ready, parsed }) => {
      if (ready) return worker.postMessage("a {b}");
      console.log(JSON.stringify(parsed.problems.map(({ line, column, rule }) => [line, column, rule])));
      process.exit(0);
    });`;
  const { stdout } = await run(process.execPath, [...options, "--input-type=module", "-e", script], {
    // Only what Node itself needs: the thread must not lean on what the tests are started with.
    env: { PATH: process.env.PATH, NODE_ENV: "production" },
  });
  return JSON.parse(stdout) as unknown;
}

test.each([
  ["plain Node, as the built pages run", []],
  ["Node with the TypeScript loader, as the worker runs", ["--import", "tsx"]],
])("the thread reads in %s", { timeout: 120_000 }, async (_what, options) => {
  expect(await readIn(options)).toEqual([
    [1, 1, "front-matter"],
    [1, 3, "expression"],
  ]);
});

test("a process that read a module ends by itself", { timeout: 120_000 }, async () => {
  const script = `
    import { readModule } from "./lib/mdx/readModule.ts";
    const { problems } = await readModule("a {b}");
    console.log(problems.length);`;
  const { stdout } = await run(process.execPath, ["--import", "tsx", "--input-type=module", "-e", script], {
    timeout: 100_000,
  });
  expect(stdout.trim()).toBe("2");
});
