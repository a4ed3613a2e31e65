// `npm run bench [-- NAME ...]`: our kernels beside a numpy and scipy reference, in turns within one run, since only their
// ratio says anything on a machine that others use as well. Exit code 0 when the answers agree, 1 when they differ, 2 when the
// reference cannot run. A target that is missed is shown and fails nothing: a loaded machine must not turn a build red.
import { mkdtempSync, readdirSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { parseArgs } from "node:util";
import { compareWithTwin } from "./bench/compareWithTwin";
import { printTable } from "./bench/printTable";
import { findPython } from "./bench/python";
import type { Bench, TableBench } from "@/tests/bench/bench";

const FOLDER = path.resolve(import.meta.dirname, "../tests/bench");
const { values, positionals } = parseArgs({ allowPositionals: true, options: { rounds: { type: "string" } } });
const rounds = Number(values.rounds ?? 15);
const say = (line: string) => process.stdout.write(`${line}\n`);

const names = readdirSync(FOLDER)
  .filter((file) => file.endsWith(".bench.ts"))
  .map((file) => file.slice(0, -".bench.ts".length));
const unknown = positionals.filter((name) => !names.includes(name));
if (unknown.length > 0 || !(Number.isInteger(rounds) && rounds >= 1)) {
  say(`bench: ${unknown.join(", ") || values.rounds}? There is ${names.join(", ")}, and --rounds from 1.`);
  process.exit(2);
}
const benches: [name: string, bench: Bench | TableBench][] = [];
for (const name of positionals.length > 0 ? positionals : names) {
  const file = pathToFileURL(path.join(FOLDER, `${name}.bench.ts`)).href;
  benches.push([name, ((await import(file)) as { bench: Bench | TableBench }).bench]);
}
const python = findPython();
if (!python && benches.some(([, bench]) => !("table" in bench))) {
  say("bench: the reference needs python3 with numpy and scipy, which are not here. On Debian:");
  say("  apt-get install python3-numpy python3-scipy");
  process.exit(2);
}
say(`Node ${process.version}${python ? `, ${python.versions}` : ""}; medians of ${rounds} rounds, in turns\n`);

let differing = 0;
for (const [name, bench] of benches) {
  say(`${name}: ${bench.title}`);
  if ("table" in bench) {
    printTable(await bench.table(), say);
    for (const note of (await bench.notes?.()) ?? []) say(`  ${note}`);
  } else {
    const folder = mkdtempSync(path.join(tmpdir(), "lagmark-bench-"));
    try {
      const { rows, notes, differences } = await compareWithTwin(
        bench,
        path.join(FOLDER, "reference", `${name}.py`),
        folder,
        rounds,
      );
      printTable(rows, say);
      for (const note of notes) say(`  ${note}`);
      for (const difference of differences) say(`  DIFFERS: ${difference}`);
      differing += differences.length;
    } finally {
      rmSync(folder, { recursive: true, force: true });
    }
  }
  say("");
}
process.exit(differing > 0 ? 1 : 0);
