import { beforeEach, describe, expect, test, vi } from "vitest";
import { askReleaseCheck } from "@/lib/commands/askReleaseCheck";
import { stopReleaseCheck } from "@/lib/commands/stopReleaseCheck";
import { readModule } from "@/lib/mdx/readModule";
import { getFailingCase } from "@/lib/queries/getFailingCase";
import { getReleaseCheck } from "@/lib/queries/getReleaseCheck";
import { makeModule } from "../support/chain";
import { NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";
import { makeReleaseCheck, soundTally } from "../support/releaseChecks";
import { TWO_CHECKS } from "../support/twoChecks";
import { expectPlain, shapeOf } from "./shape";

// The reader starts a thread of its own for every text.
vi.setConfig({ testTimeout: 90_000, hookTimeout: 90_000 });

const { checks: plans } = await readModule(TWO_CHECKS);
const [list, lock] = [plans[0]!, plans[1]!];

let firm: Firm;
let moduleId: string;
beforeEach(async () => {
  firm = await makeFirm();
  moduleId = (await makeModule(firm, { code: "TWO-1", source: TWO_CHECKS })).id;
});
const view = async () => (await getReleaseCheck(firm.lead, moduleId))!;
const ask = (preview: boolean) => askReleaseCheck(firm.lead, { moduleId, preview }, NOW);

describe("a check", () => {
  test("is not tried, waits, is under way, stopped, failed, finished", async () => {
    const state = async () => (await view()).checks.map(({ run }) => run?.state ?? null);
    expect(await state()).toEqual([null, null]);
    await ask(false);
    expect(await state()).toEqual(["waiting", "waiting"]);
    await ownerRows("UPDATE release_check_runs SET tried = 40");
    expect(await state()).toEqual(["running", "running"]);
    await stopReleaseCheck(firm.lead, { moduleId }, NOW);
    expect(await state()).toEqual(["stopped", "stopped"]);
    const [run] = await ownerRows<{ id: string }>("SELECT id FROM release_check_runs");
    await insert("progress", {
      subjectId: run!.id,
      job: "check-release",
      step: "failed",
      done: 0,
      total: 1,
      fault: "AB",
    });
    expect((await state()).sort()).toEqual(["failed", "stopped"]);
    await makeReleaseCheck(list);
    await makeReleaseCheck(lock);
    expect((await view()).checks.map(({ within, run }) => [within, run])).toEqual([
      [true, null],
      [true, null],
    ]);
  });

  test("outside a bound says in which line", async () => {
    await makeReleaseCheck(list, { read: { tried: 1000, met: 940 } });
    const [{ within, result }] = (await view()).checks as [Awaited<ReturnType<typeof view>>["checks"][number]];
    expect(within).toBe(false);
    expect(result!.lines.filter((line) => !line.within).map(({ id, met, tried }) => [id, met, tried])).toEqual([
      ["read", 940, 1000],
    ]);
  });

  test("a look at fewer cases stands apart and finishes nothing", async () => {
    await ask(true);
    await ownerRows("UPDATE release_check_runs SET tried = 200, tally = $1, finished_at = now()", [
      JSON.stringify(soundTally(list)),
    ]);
    const { checks, sitting } = await view();
    expect(checks[0]).toMatchObject({ result: null, run: null, preview: { progress: { of: 200, ofWhole: 0 } } });
    expect(checks[0]!.preview!.table!.lines.length).toBeGreaterThan(3);
    expect(sitting).toBeNull();
  });
});

test("the sitting as a whole is told once every check has finished", async () => {
  await makeReleaseCheck(list);
  expect((await view()).sitting).toBeNull();
  await makeReleaseCheck(lock);
  // 0.99 of careful people a check, two checks; guessing at 1e-4 a check and two cases.
  expect((await view()).sitting).toMatchObject({ careful: 0.99 * 0.99, guessedWithin: true });
});

test("plain data with its own fields and no other", async () => {
  await makeReleaseCheck(list);
  await makeReleaseCheck(lock);
  await ask(true);
  const found = await view();
  expectPlain(found);
  const opaque = ["checks[].result", "checks[].preview.progress", "sitting"];
  expect(shapeOf(found, opaque)).toEqual(
    `checks[].id checks[].kind checks[].needed checks[].preview.progress checks[].preview.table checks[].result checks[].run
     checks[].title checks[].within code errors freshCases moduleId revision sitting title`.split(/\s+/),
  );
});

test("a draft with a fault has no checks to try", async () => {
  const faulty = await makeModule(firm, { code: "TWO-2", source: `${TWO_CHECKS}\n<Unknown />\n` });
  expect(await getReleaseCheck(firm.lead, faulty.id)).toMatchObject({ errors: 1, checks: [], sitting: null });
});

describe("a case to look at", () => {
  const open = (over: object = {}) =>
    getFailingCase(firm.lead, moduleId, { checkId: "list", line: "read", n: 3, hand: 0, ...over });

  test("is made again with its truth and the marking of its hand-in, the same each time", async () => {
    const shown = (await open())!;
    expect(shown).toMatchObject({ code: "TWO-1", checkId: "list", fault: "", worksFromFiles: true });
    expect(shown.marking!.rows.length).toBeGreaterThan(4);
    expect(JSON.parse(shown.truth)).toHaveProperty("scene");
    expect(await open()).toEqual(shown);
    expectPlain(JSON.parse(JSON.stringify(shown)));
  });

  test("a guess counts its hand-ins; a whole case has none here", async () => {
    const [first, ninth] = [await open({ line: "guess" }), await open({ line: "guess", hand: 9 })];
    expect(ninth!.answers).not.toEqual(first!.answers);
    expect(await open({ line: "whole" })).toMatchObject({ answers: {}, marking: null });
  });

  test.each([
    ["another check", { checkId: "none" }],
    ["a line that there is none of", { line: "wrong/none" }],
    ["an inherited name", { line: "wrong/constructor" }],
    ["a case beyond the last", { n: 1000 }],
    ["a case that is no number", { n: NaN }],
    ["a broken number", { n: 1.5 }],
    ["a hand-in beyond the last", { line: "guess", hand: 10 }],
    ["a second hand-in of one", { hand: 1 }],
  ])("%s is not there", async (_what, over) => expect(await open(over)).toBeNull());
});
