import { readFileSync, readdirSync } from "node:fs";
import path from "node:path";
import { expect, test } from "vitest";

const folder = path.join(import.meta.dirname, "../../lib/checks");
const files = readdirSync(folder, { recursive: true, encoding: "utf8" }).filter((name) => name.endsWith(".ts"));

// What the language does not fix to the last digit, or what differs from run to run.
const FORBIDDEN =
  /Math\.(?!sqrt|floor|ceil|round|abs|min|max|sign|imul|PI)\w+|\*\*|Date\.now|new Date\(\)|performance\.|toLocale|Intl\./;

test("there is something to look at", () => expect(files.length).toBeGreaterThan(50));

test.each(files)("%s computes the same on every machine", (name) => {
  const lines = readFileSync(path.join(folder, name), "utf8").split("\n");
  const found = lines.filter((line) => !/^\s*(\/?\*|\/\/)/.test(line) && FORBIDDEN.test(line.replace(/\/\*\*/g, "")));
  expect(found).toEqual([]);
});
