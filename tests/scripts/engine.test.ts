import { spawnSync } from "node:child_process";
import path from "node:path";
import { describe, expect, test } from "vitest";
import { codes } from "@/scripts/engine/codes";
import { UsageError } from "@/scripts/engine/UsageError";
import second from "@/tests/reference/signal-codes.json";

const ROOT = path.resolve(import.meta.dirname, "../..");
const engine = (...args: string[]) =>
  spawnSync(process.execPath, ["--import", "./scripts/register.mjs", "scripts/engine.ts", ...args], {
    cwd: ROOT,
    encoding: "utf8",
  });

const linesOf = async (...args: string[]) => {
  const lines: object[] = [];
  await codes(args, async (line) => void lines.push(line));
  return lines;
};

describe("engine codes", () => {
  test("prints a line per satellite as a second program has it", async () => {
    const lines = await linesOf("GPS_L1CA");
    expect(lines).toHaveLength(126);
    for (const [prn, length, first24Octal, last24Octal, ones, , sha256] of second.signals.GPS_L1CA)
      expect(lines).toContainEqual({ prn, length, sha256, first24Octal, last24Octal, ones });
  });

  test.each([[[]], [["GPS_L9"]], [["GPS_L1CA", "GPS_L1CA"]], [["GPS_L1CA", "--prn", "1"]], [["toString"]]])(
    "refuses %j as a fault of the call",
    async (args) => expect(linesOf(...args)).rejects.toThrow(UsageError),
  );
});

describe("the command itself", () => {
  test("answers on standard output in JSON lines, and with 0", () => {
    const { status, stdout, stderr } = engine("codes", "GPS_L1CA");
    expect([status, stderr]).toEqual([0, ""]);
    expect(stdout.endsWith("}\n")).toBe(true);
    expect(JSON.parse(stdout.split("\n")[0])).toMatchObject({ prn: 1, first24Octal: "62034511" });
  });

  test.each([
    [["codes", "GPS_L9"], "GPS_L9"],
    [["codes", "--fast"], "--fast"],
    [["corr"], "corr"],
    [[], "nothing"],
  ])("answers %j on standard error, naming %s, and with 2", (args, named) => {
    const { status, stdout, stderr } = engine(...args);
    expect([status, stdout]).toEqual([2, ""]);
    expect(stderr).toContain(named);
    expect(stderr.trim().split("\n")).toHaveLength(1);
  });
});
