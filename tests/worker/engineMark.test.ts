import { beforeEach, expect, test } from "vitest";
import { execFile } from "node:child_process";
import path from "node:path";
import { kindOf } from "@/lib/checks/registry";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { sealSecret } from "@/lib/commands/caseSecret";
import { markCase } from "@/lib/commands/markCase";
import { plainTruth } from "@/lib/commands/plainTruth";
import { computeCase } from "@/lib/worker/computeCase";
import { makeAssignment, makeCase, makeHandIn, makeOpenCase, makeRelease, makeSitting } from "../support/chain";
import { makeFirm, type Firm } from "../support/factories";
import { insert } from "../support/owner";
import { checkPlan } from "../support/samples";
import { PUBLIC_ORIGIN, rowsOf, SEED_KEY } from "./tools";

const SEED = "5e".repeat(32);
const KIND = kindOf("correlator-reading");
const PLAN = checkPlan({
  ...{ id: "reading", kind: KIND.id, version: KIND.version, quantities: [] },
  parameters: Object.fromEntries(KIND.parameters.map(({ name, default: value }) => [name, value])),
});

/** As a person with the worker's settings calls it. */
function engineMark(caseId: string): Promise<{ code: number; output: string }> {
  const args = ["--import", "./scripts/register.mjs", "scripts/engine.ts", "mark", caseId];
  const { PATH, WORKER_DATABASE_URL } = process.env;
  const env = { PATH, WORKER_DATABASE_URL, SEED_KEY } as unknown as NodeJS.ProcessEnv;
  return new Promise((resolve) =>
    execFile(process.execPath, args, { cwd: path.resolve(import.meta.dirname, "../.."), env }, (error, out, told) =>
      resolve({ code: error ? Number(error.code) : 0, output: out + told }),
    ),
  );
}

let firm: Firm;
beforeEach(async () => {
  firm = await makeFirm();
});

async function opened() {
  const assignment = await makeAssignment(firm, { release: await makeRelease(firm, { checks: [PLAN] }) });
  const sitting = await makeSitting(firm, { assignment });
  const drawn = await makeCase(firm, { sitting, checkId: PLAN.id, kind: PLAN.kind });
  const found = await makeOpenCase(firm, { case: drawn });
  const truth = plainTruth(KIND.build(SEED, PLAN).truth);
  const sealed = sealSecret({ seedHex: SEED, truth }, drawn.id, SEED_KEY);
  await insert("case_secrets", { caseId: drawn.id, sealed, truthSha256: fingerprintOf(truth), engineVersion: "1.0.0" });
  return { found, caseId: drawn.id };
}

test("a record of the register comes out again, and nothing is written", async () => {
  const { found, caseId } = await opened();
  await makeHandIn(firm, { case: found });
  const engine = {
    build: async () => KIND.build(SEED, PLAN),
    mark: async (...[seedHex, plan, answers]: Parameters<typeof KIND.mark>) => {
      const result = computeCase({ seedHex, plan, answers }, () => undefined);
      if (!("marking" in result)) throw new Error("no marking");
      return result;
    },
  };
  await markCase(caseId, { engine, seedKey: SEED_KEY, publicOrigin: PUBLIC_ORIGIN });
  const before = await rowsOf("marking_records");
  const { code, output } = await engineMark(caseId);
  expect([code, output]).toEqual([0, expect.stringMatching(/^\{.*\}\n$/)]);
  expect(JSON.parse(output)).toMatchObject({
    caseId,
    truthAsDrawn: true,
    recordsAlike: [{ sequence: 1, marking: "correlator-reading@1", alike: true }],
    marking: "correlator-reading@1",
    met: false,
  });
  expect(await rowsOf("marking_records")).toEqual(before);
});

test("nothing is computed of a case that is still open", async () => {
  const { caseId } = await opened();
  const { code, output } = await engineMark(caseId);
  expect([code, output.includes("is not handed in"), output.includes(SEED)]).toEqual([2, true, false]);
});
