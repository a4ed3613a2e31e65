import { createHash } from "node:crypto";
import { beforeEach, expect, test } from "vitest";
import { buildCase } from "@/lib/commands/buildCase";
import { openSecret } from "@/lib/commands/caseSecret";
import { reportProgress } from "@/lib/commands/reportProgress";
import { Capture } from "@/models";
import { makeCase } from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import { makeFirm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { publicCase } from "../support/samples";
import { FakeEngine } from "./fake-engine";
import { queued, rowsOf, SEED_KEY, storage } from "./tools";

let caseId: string;
beforeEach(async () => {
  caseId = (await makeCase(await makeFirm())).id;
});
const build = (engine = new FakeEngine()) => buildCase(caseId, { engine, storage, seedKey: SEED_KEY }, () => NOW);
const sha256 = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");
type Secret = { sealed: Buffer; truth_sha256: string; engine_version: string };

test("opens the case: what the technician may see, the clock from now on for the check's minutes", async () => {
  expect(await build()).toBe("built");
  const [view] = await rowsOf<object>("case_views");
  expect(view).toMatchObject({
    case_id: caseId,
    view: publicCase(),
    draws: 12,
    opened_at: NOW,
    ends_at: minutesFrom(NOW, 20),
  });
});

test("stores each file under a row that says what it is", async () => {
  await build();
  const [data, meta] = await Capture.findAll({ where: { caseId }, order: ["name"] });
  expect(data).toMatchObject({ name: "capture.sigmf-data", sizeBytes: "32", mediaType: "application/octet-stream" });
  expect(data!.labels).toEqual({ origin: "generated", signal: "GPS L1 C/A", datatype: "ci8" });
  expect(meta!.labels).toEqual({ origin: "generated", signal: "GPS L1 C/A" });
  for (const file of [data!, meta!]) expect(sha256((await storage.get(file.storageKey))!)).toBe(file.sha256);
});

test("seals seed and truth; they open with the key and for this case only", async () => {
  const engine = new FakeEngine();
  await build(engine);
  const [{ sealed, truth_sha256 }] = (await rowsOf<Secret>("case_secrets")) as [Secret];
  const [seedHex] = engine.seeds;
  expect(seedHex).toMatch(/^[0-9a-f]{64}$/);
  const opened = openSecret(sealed, caseId, SEED_KEY);
  expect(opened).toMatchObject({ seedHex, truth: { lagChips: 88.8, dataBits: [1, -1] } });
  // The truth's canonical JSON, written by hand.
  const draw = `truth-${seedHex!.slice(0, 16)}`;
  expect(truth_sha256).toBe(sha256(Buffer.from(`{"dataBits":[1,-1],"draw":"${draw}","lagChips":88.8}`)));
  expect(() => openSecret(sealed, "another case", SEED_KEY)).toThrow();
  expect(() => openSecret(sealed, caseId, Buffer.alloc(32, 8).toString("base64url"))).toThrow();
});

test("two cases have two seeds", async () => {
  const engine = new FakeEngine();
  await build(engine);
  const other = (await makeCase(await makeFirm())).id;
  await buildCase(other, { engine, storage, seedKey: SEED_KEY }, () => NOW);
  expect(new Set(engine.seeds).size).toBe(2);
});

test("asks for the case to be closed half a minute after its end", async () => {
  await build();
  expect(await queued("close-case")).toEqual([{ data: { caseId }, startAfter: minutesFrom(NOW, 20.5) }]);
});

test("clears the progress that was told", async () => {
  await reportProgress(caseId, "build-case", { step: "drawing", done: 1, total: 2 });
  await build();
  expect(await rowsOf("progress")).toEqual([]);
});

test("run twice, the first case stays", async () => {
  await build();
  const before = await rowsOf("case_secrets");
  const engine = new FakeEngine();
  expect(await build(engine)).toBe("was built");
  expect(engine.seeds).toEqual([]);
  expect(await rowsOf("case_secrets")).toEqual(before);
  expect(await queued("close-case")).toHaveLength(1);
});

test("two runs at once leave one truth, and the files that belong to it", async () => {
  const [one, two] = [new FakeEngine(), new FakeEngine()];
  const outcomes = await Promise.all([build(one), build(two)]);
  expect(outcomes.sort()).toEqual(["built", "was built"]);
  const [{ sealed }] = (await rowsOf<Secret>("case_secrets")) as [Secret];
  const { seedHex } = openSecret(sealed, caseId, SEED_KEY);
  const captures = await Capture.findAll({ where: { caseId } });
  expect(captures).toHaveLength(2);
  for (const { storageKey, sha256: expected } of captures)
    expect(sha256((await storage.get(storageKey))!)).toBe(expected);
  const lost = [...one.seeds, ...two.seeds].find((seed) => seed !== seedHex)!;
  const lostSha = sha256(createHash("sha256").update(lost).digest());
  expect(await storage.get(`cases/${caseId}/${lostSha.slice(0, 16)}/capture.sigmf-data`)).toBeNull();
});

test("killed between storing the files and the rows, nothing is opened and the next run does it all", async () => {
  // Sealing comes after the view and the files' rows.
  await expect(buildCase(caseId, { engine: new FakeEngine(), storage, seedKey: "cut" }, () => NOW)).rejects.toThrow();
  for (const table of ["case_views", "case_secrets", "captures"]) expect(await rowsOf(table)).toEqual([]);
  expect(await queued("close-case")).toEqual([]);
  expect(await build()).toBe("built");
  const captures = await Capture.findAll({ where: { caseId } });
  for (const { storageKey, sha256: expected } of captures)
    expect(sha256((await storage.get(storageKey))!)).toBe(expected);
});

test("neither seed nor truth stands anywhere the web process may read", async () => {
  const engine = new FakeEngine();
  await build(engine);
  const [seedHex] = engine.seeds as [string];
  const readable = await ownerRows<{ name: string }>(`
    SELECT format('%I.%I', schemaname, tablename) AS name FROM pg_tables
    WHERE schemaname IN ('public', 'jobs') AND has_table_privilege('lagmark_web', format('%I.%I', schemaname, tablename), 'SELECT')`);
  expect(readable.map(({ name }) => name)).toContain("public.case_views");
  expect(readable.map(({ name }) => name)).not.toContain("public.case_secrets");
  for (const { name } of readable) {
    const rows = await ownerRows<{ text: string }>(`SELECT t::text AS text FROM ${name} t`);
    const all = rows.map(({ text }) => text).join("\n");
    for (const secret of [seedHex, Buffer.from(seedHex, "hex").toString("base64url"), "truth-", "88.8"])
      expect(all, `${name} holds ${secret}`).not.toContain(secret);
  }
});
