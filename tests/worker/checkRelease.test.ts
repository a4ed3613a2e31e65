import { beforeEach, describe, expect, test } from "vitest";
import { checkRelease } from "@/lib/commands/checkRelease";
import type { SliceTask, TrialEngine, TriedSlice } from "@/lib/commands/engine";
import { kindOf } from "@/lib/checks/registry";
import { FULL_CASES, PREVIEW_CASES, WHOLE_CASES } from "@/lib/checks/release-check/rule";
import { emptyTally } from "@/lib/checks/release-check/tally";
import { releaseCheckFingerprint } from "@/lib/release-checks/releaseCheckFingerprint";
import { trySlice } from "@/lib/worker/trySlice";
import { planOf } from "../checks/planOf";
import { minutesFrom, NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";
import { queued, rowsOf, stop } from "./tools";

const plan = planOf(kindOf("satellites"));
const fingerprint = releaseCheckFingerprint(plan);
const now = () => NOW;

/** Counts a case as one reading that is met; takes 300 cases a slice, and one whole one. */
class CountingEngine implements TrialEngine {
  readonly slices: SliceTask[] = [];
  constructor(private readonly before: (slice: SliceTask) => Promise<unknown> | void = () => undefined) {}

  async trySlice(slice: SliceTask): Promise<TriedSlice> {
    this.slices.push(slice);
    await this.before(slice);
    const { part, from, to } = slice;
    const count = part === "whole" ? 1 : Math.min(300, to - from);
    const line = part === "whole" ? "whole" : "read";
    return { count, tally: { ...emptyTally(), lines: { [line]: { tried: count, met: count } }, built: count } };
  }
}

let firm: Firm;
let runId: string;
beforeEach(async () => {
  firm = await makeFirm();
  runId = await makeRun();
});
const makeRun = async (over: object = {}) =>
  (
    await insert<{ id: string }>("release_check_runs", {
      ...{ fingerprint, preview: false, plan, employerId: firm.employer.id },
      ...{ askedBy: firm.lead.personId, askedAt: NOW },
      ...over,
    })
  ).id;
const run = async () =>
  (await rowsOf<{ tried: number; whole_tried: number; tally: { lines: object } }>("release_check_runs"))[0];

test("tries all cases slice by slice, the whole ones last, and keeps the record", async () => {
  const engine = new CountingEngine();
  expect(await checkRelease(runId, engine, now)).toBe("finished");
  expect(engine.slices.slice(0, 5).map(({ part, from, to }) => [part, from, to])).toEqual([
    ["case", 0, FULL_CASES],
    ["case", 300, FULL_CASES],
    ["case", 600, FULL_CASES],
    ["case", 900, FULL_CASES],
    ["whole", 0, WHOLE_CASES],
  ]);
  expect(engine.slices.every(({ baseSeedHex }) => baseSeedHex === fingerprint)).toBe(true);
  const [record] = await rowsOf<{ fingerprint: string; tally: { lines: object }; finished_at: Date }>("release_checks");
  expect(record).toMatchObject({ fingerprint, finished_at: NOW });
  expect(record!.tally.lines).toEqual({ read: { tried: 1000, met: 1000 }, whole: { tried: 25, met: 25 } });
  expect(await rowsOf("release_check_runs")).toEqual([]);
});

test("stands in the trail under the firm that asked for it", async () => {
  await checkRelease(runId, new CountingEngine(), now);
  const entries = await ownerRows(
    "SELECT act, employer_id, actor_id FROM trail_entries WHERE subject_table = 'release_checks'",
  );
  expect(entries).toEqual([{ act: "release_checks added", employer_id: firm.employer.id, actor_id: null }]);
});

test("a preview tries fewer, none of them whole, and becomes no record", async () => {
  const preview = await makeRun({ preview: true });
  expect(await checkRelease(preview, new CountingEngine(), now)).toBe("finished");
  const [kept] = await ownerRows<object>(
    "SELECT tried, whole_tried, finished_at FROM release_check_runs WHERE preview",
  );
  expect(kept).toEqual({ tried: PREVIEW_CASES, whole_tried: 0, finished_at: NOW });
  expect(await rowsOf("release_checks")).toEqual([]);
});

describe("run again", () => {
  test("after a kill it takes up where the last slice was stored", async () => {
    const dies = new CountingEngine(({ from }) => void (from === 600 && stop()));
    await expect(checkRelease(runId, dies, now)).rejects.toThrow("killed");
    expect(await run()).toMatchObject({ tried: 600, whole_tried: 0, tally: { lines: { read: { tried: 600 } } } });
    const engine = new CountingEngine();
    expect(await checkRelease(runId, engine, now)).toBe("finished");
    expect(engine.slices[0]).toMatchObject({ part: "case", from: 600 });
  });

  test("when it has finished it does nothing", async () => {
    await checkRelease(runId, new CountingEngine(), now);
    const engine = new CountingEngine();
    expect(await checkRelease(runId, engine, now)).toBe("was finished");
    expect(engine.slices).toEqual([]);
  });

  test("at once with another, no case is counted twice", async () => {
    const outcomes = await Promise.all([0, 1].map(() => checkRelease(runId, new CountingEngine(), now)));
    expect(outcomes.filter((outcome) => outcome === "finished")).toHaveLength(1);
    const [record] = await rowsOf<{ tally: { lines: { read: object } } }>("release_checks");
    expect(record!.tally.lines.read).toEqual({ tried: 1000, met: 1000 });
  });
});

test("stopped meanwhile, the slice under way is not counted", async () => {
  const stops = new CountingEngine(({ from }) =>
    from === 300 ? ownerRows("UPDATE release_check_runs SET stopped_at = now()") : undefined,
  );
  expect(await checkRelease(runId, stops, now)).toBe("another is at it");
  expect(await run()).toMatchObject({ tried: 300 });
  expect(await checkRelease(runId, new CountingEngine(), now)).toBe("stopped");
});

test("after a minute it hands on to a job that follows", async () => {
  let minutes = 0;
  const slow = new CountingEngine(() => void (minutes += 0.7));
  expect(await checkRelease(runId, slow, () => minutesFrom(NOW, minutes))).toBe("goes on");
  expect(await run()).toMatchObject({ tried: 600 });
  expect(await queued("check-release")).toMatchObject([{ data: { runId } }]);
});

test("a plan under another fingerprint is computed for nobody", async () => {
  const id = await makeRun({ fingerprint: "0".repeat(64) });
  const engine = new CountingEngine();
  await expect(checkRelease(id, engine, now)).rejects.toThrow(/of another plan or engine/);
  expect(engine.slices).toEqual([]);
});

test("a stored slice forgets an earlier fault", async () => {
  await insert("progress", {
    subjectId: runId,
    job: "check-release",
    step: "failed",
    done: 0,
    total: 1,
    fault: "AB12",
  });
  await checkRelease(runId, new CountingEngine(), now);
  expect(await rowsOf("progress")).toEqual([]);
});

test("a slice takes about a second and at least one case, and says how many", () => {
  const slice = { plan, baseSeedHex: fingerprint, part: "case" as const, from: 7, to: 9 };
  const { count, tally } = trySlice(slice);
  expect(count).toBe(2);
  expect(tally.lines.solvable).toEqual({ tried: 2, met: 2 });
  expect(trySlice({ ...slice, from: 8, to: 9 }).count).toBe(1);
});
