import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { expect, test } from "vitest";

const root = path.resolve(import.meta.dirname, "../..");
const files = ["lib/numeric", "lib/gnss"].flatMap((folder) =>
  readdirSync(path.join(root, folder))
    .filter((name) => name.endsWith(".ts"))
    .map((name) => `${folder}/${name}`),
);
const code = (file: string) =>
  readFileSync(path.join(root, file), "utf8")
    .replace(/\/\*[\s\S]*?\*\//g, "")
    .replace(/\/\/.*$/gm, "");

/** Rounded the same everywhere by the language's own standard; every other Math function may differ between engines. */
const EXACT = [
  "abs",
  "clz32",
  "floor",
  "ceil",
  "round",
  "trunc",
  "sign",
  "min",
  "max",
  "sqrt",
  "imul",
  "PI",
  "SQRT1_2",
  "SQRT2",
];

test.each(files)("%s uses exactly rounded arithmetic only", (file) => {
  const used = [...code(file).matchAll(/Math\.(\w+)/g)].map(([, name]) => name);
  expect(used.filter((name) => !EXACT.includes(name))).toEqual([]);
  expect(code(file)).not.toMatch(/\*\*/); // the power operator is Math.pow
  expect(code(file)).not.toMatch(/\bDate\b|performance\b|toFixed|toPrecision|localeCompare|Intl\b/);
});
