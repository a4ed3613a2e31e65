import { beforeEach, describe, expect, test, vi } from "vitest";
import { askReleaseCheck } from "@/lib/commands/askReleaseCheck";
import { saveDraft } from "@/lib/commands/saveDraft";
import { stopReleaseCheck } from "@/lib/commands/stopReleaseCheck";
import { readModule } from "@/lib/mdx/readModule";
import { makeModule } from "../support/chain";
import { NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";
import { makeReleaseCheck } from "../support/releaseChecks";
import { everythingStored, expectNothingLeft, jobsOf } from "../support/written";
import { refusals } from "./refusals";
import { TWO_CHECKS } from "../support/twoChecks";

// The reader starts a thread of its own for every text.
vi.setConfig({ testTimeout: 90_000 });

let firm: Firm;
let other: Firm;
let moduleId: string;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  moduleId = (await makeModule(firm, { code: "TWO-1", source: TWO_CHECKS })).id;
});
const ask = (preview = false, who = firm.lead) => askReleaseCheck(who, { moduleId, preview }, NOW);
const stop = () => stopReleaseCheck(firm.lead, { moduleId }, NOW);
type Run = { id: string; fingerprint: string; preview: boolean; stopped_at: Date | null; tried: number };
const runs = () => ownerRows<Run>("SELECT * FROM release_check_runs ORDER BY preview, fingerprint");
const jobs = async () => (await jobsOf("check-release")).map(({ runId }) => runId).sort();

describe("asking", () => {
  test("adds one run and one job for each check", async () => {
    expect(await ask()).toEqual({ asked: 2 });
    const added = await runs();
    expect(added.map(({ preview, tried }) => [preview, tried])).toEqual([
      [false, 0],
      [false, 0],
    ]);
    expect(await jobs()).toEqual(added.map(({ id }) => id).sort());
  });

  test("again adds nothing while they are under way, also at once and from another firm", async () => {
    await Promise.all([ask(), ask()]);
    const elsewhere = await makeModule(other, { code: "TWO-1", source: TWO_CHECKS });
    expect(await askReleaseCheck(other.lead, { moduleId: elsewhere.id, preview: false }, NOW)).toEqual({ asked: 0 });
    expect(await runs()).toHaveLength(2);
    expect(await jobs()).toHaveLength(2);
  });

  test("a look at fewer cases is a run of its own", async () => {
    await ask(true);
    await ask();
    expect((await runs()).map(({ preview }) => preview)).toEqual([false, false, true, true]);
  });

  test("leaves out what has finished, under whatever name", async () => {
    const { checks } = await readModule(TWO_CHECKS);
    await makeReleaseCheck({ ...checks[0]!, id: "another", title: "Other words", minutes: 5 });
    expect(await ask()).toEqual({ asked: 1 });
  });

  test("two checks with the same quantities and parameters are tried once", async () => {
    const twice = TWO_CHECKS.replace("[list, lock]", "[list, lock, more]").concat(
      '\n<Check id="more" kind="satellites" minutes={20}>\nMore.\n</Check>\n',
    );
    await saveDraft(firm.lead, { moduleId, title: "List and prove", source: twice, revision: 1 });
    expect(await ask()).toEqual({ asked: 2 });
  });

  test("refuses a draft with a fault in it", async () => {
    await saveDraft(firm.lead, { moduleId, title: "x", source: `${TWO_CHECKS}\n<Unknown />\n`, revision: 1 });
    const before = await everythingStored();
    await expect(ask()).rejects.toMatchObject({ publicMessage: "1 error to fix first." });
    expect(await everythingStored()).toEqual(before);
  });

  test("a failure at the end leaves nothing", () => expectNothingLeft("release_check_runs", () => ask()));

  refusals({
    allowed: "lead",
    setting: () => ({ firm, other, id: moduleId }),
    act: (actor, id) => askReleaseCheck(actor, { moduleId: id, preview: false }, NOW),
  });
});

describe("stopping", () => {
  test("stops the own runs; asked again they take up where they stood", async () => {
    await ask();
    await ownerRows("UPDATE release_check_runs SET tried = 120");
    expect(await stop()).toEqual({ stopped: 2 });
    expect((await runs()).every(({ stopped_at }) => stopped_at !== null)).toBe(true);
    expect(await stop()).toEqual({ stopped: 0 });
    expect(await ask()).toEqual({ asked: 2 });
    expect((await runs()).map(({ stopped_at, tried }) => [stopped_at, tried])).toEqual([
      [null, 120],
      [null, 120],
    ]);
    expect(await jobs()).toHaveLength(4);
  });

  test("leaves alone what another firm asked for", async () => {
    const elsewhere = await makeModule(other, { code: "TWO-1", source: TWO_CHECKS });
    await askReleaseCheck(other.lead, { moduleId: elsewhere.id, preview: false }, NOW);
    expect(await stop()).toEqual({ stopped: 0 });
  });

  refusals({
    allowed: "lead",
    setting: () => ({ firm, other, id: moduleId }),
    act: (actor, id) => stopReleaseCheck(actor, { moduleId: id }, NOW),
  });
});

test("what was tried as often as it may be is taken up when it is asked for again", async () => {
  await ask();
  const [run] = await runs();
  await insert("progress", {
    subjectId: run!.id,
    job: "check-release",
    step: "failed",
    done: 0,
    total: 1,
    fault: "AB12",
  });
  expect(await ask()).toEqual({ asked: 1 });
});
