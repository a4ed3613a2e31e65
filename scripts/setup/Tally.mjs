import fs from "node:fs";
import path from "node:path";
import { lastLines, run } from "./run.mjs";
import { Refusal, say } from "./say.mjs";
import { isStopping } from "./shutdown.mjs";

/** Counts what passed and what failed: one for every step, one for every test of a test run. */
export class Tally {
  passed = 0;
  failed = 0;
  #root;
  #logs;

  constructor(root, logs) {
    [this.#root, this.#logs] = [root, logs];
    fs.rmSync(logs, { recursive: true, force: true });
    fs.mkdirSync(logs, { recursive: true });
  }

  /** @returns whether the step went through; its failure is told and counted, never thrown */
  async step(name, work) {
    const begun = Date.now();
    try {
      await work();
      this.passed += 1;
      say(`passed  ${name} (${secondsSince(begun)})`);
      return true;
    } catch (error) {
      this.fail(`${name} (${secondsSince(begun)})`, error instanceof Refusal ? error.message : error.stack);
      return false;
    }
  }

  fail(name, reason) {
    // Whoever stops the run ends its commands: that says nothing about the project.
    if (isStopping()) return;
    this.failed += 1;
    say(`FAILED  ${name}\n${reason}`);
  }

  /** A step that is one command of the installed packages. */
  command = (name, args, env) => this.step(name, () => this.#mustSucceed(name, args, env));

  /** Runs one vitest project and adds its tests; a run that breaks or finds nothing counts as one failure. */
  async tests(project, env) {
    const begun = Date.now();
    const results = path.join(this.#logs, `${project}.json`);
    const reporters = ["--reporter=default", "--reporter=json", `--outputFile.json=${results}`];
    const args = [bin("vitest", "vitest.mjs"), "run", "--project", `${project}*`, ...reporters];
    const log = path.join(this.#logs, `${project}.log`);
    const { code, output } = await run("node", args, { cwd: this.#root, env: { ...env, NO_COLOR: "1" }, log });
    const counts = readCounts(results);
    this.passed += counts.passed;
    this.failed += counts.failed;
    const said = `${project} tests: ${counts.passed} passed, ${counts.failed} failed (${secondsSince(begun)})`;
    if (code === 0 && counts.passed > 0 && counts.failed === 0) return say(`passed  ${said}`);
    if (counts.failed > 0) return say(`FAILED  ${said}\n${failuresIn(output)}`);
    this.fail(said, lastLines(output, 60));
  }

  async #mustSucceed(name, args, env) {
    const log = path.join(this.#logs, `${name}.log`);
    const { code, output } = await run("node", args, { cwd: this.#root, env, log });
    if (code !== 0) throw new Refusal(lastLines(output, 60));
  }
}

/** The program of an installed package, run without npx and without a shell. */
export const bin = (name, file) => path.join("node_modules", name, file);

// A test that was skipped has not passed.
function readCounts(file) {
  if (!fs.existsSync(file)) return { passed: 0, failed: 0 };
  const { numPassedTests, numTotalTests } = JSON.parse(fs.readFileSync(file, "utf8"));
  return { passed: numPassedTests, failed: numTotalTests - numPassedTests };
}

function failuresIn(output) {
  const from = output.indexOf("Failed Tests");
  return from < 0 ? lastLines(output, 60) : output.slice(from).split("\n").slice(0, 200).join("\n");
}

const secondsSince = (begun) => `${((Date.now() - begun) / 1000).toFixed(1)} s`;
