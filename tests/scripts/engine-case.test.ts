import { createHash } from "node:crypto";
import { mkdtempSync, readFileSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { describe, expect, test } from "vitest";
import { correlatorReading } from "@/lib/checks/correlator-reading/correlatorReading";
import { plainTruth } from "@/lib/commands/plainTruth";
import { drawCase } from "@/scripts/engine/case";
import { mark } from "@/scripts/engine/mark";
import { UsageError } from "@/scripts/engine/UsageError";
import { planOf } from "../checks/planOf";

const SEED = "5e".repeat(32);

async function linesOf(...args: string[]) {
  const lines: Record<string, unknown>[] = [];
  await drawCase(args, async (line) => void lines.push(line as Record<string, unknown>));
  return lines;
}

describe("engine case", () => {
  test("re-creates what the kind builds from the seed, and writes its files", async () => {
    const folder = mkdtempSync(path.join(tmpdir(), "case-"));
    const [line] = await linesOf("correlator-reading", "--seed", SEED, "--out", folder);
    const built = correlatorReading.build(SEED, planOf(correlatorReading));
    expect(line).toMatchObject({ kind: "correlator-reading", version: 1, draws: built.draws });
    expect(line!.truth).toEqual(plainTruth(built.truth));
    const [file] = built.files;
    const sha256 = createHash("sha256").update(file!.bytes).digest("hex");
    expect(line!.files).toEqual([{ name: "trace.csv", mediaType: "text/csv", bytes: file!.bytes.length, sha256 }]);
    expect(new Uint8Array(readFileSync(path.join(folder, "trace.csv")))).toEqual(file!.bytes);
  });

  test("takes a check of a release as it was written", async () => {
    const plan = { ...planOf(correlatorReading), title: "Read it", quantities: [] };
    plan.parameters = { ...plan.parameters, prn: [7, 7] };
    const file = path.join(mkdtempSync(path.join(tmpdir(), "plan-")), "plan.json");
    writeFileSync(file, JSON.stringify(plan));
    const [line] = await linesOf("correlator-reading", "--seed", SEED, "--plan", file);
    expect(line).toMatchObject({ publicCase: { title: "Read it", data: { prn: 7 } } });
    await expect(linesOf("satellites", "--seed", SEED, "--plan", file)).rejects.toThrow("not of satellites@1");
  });

  test.each([
    [[]],
    [["correlator-reading"]],
    [["correlator-reading", "--seed", "5e"]],
    [["nothing", "--seed", SEED]],
    [["correlator-reading", "--version", "99", "--seed", SEED]],
    [["correlator-reading", "--version", "one", "--seed", SEED]],
    [["formula", "--seed", SEED]],
  ])("refuses %j as a fault of the call", async (args) => expect(linesOf(...args)).rejects.toThrow(UsageError));
});

test.each([[[]], [["7"]], [["12345678-1234-1234-1234-123456789012", "more"]]])(
  "engine mark refuses %j as a fault of the call",
  async (args) => expect(mark(args, async () => undefined)).rejects.toThrow(UsageError),
);
