import "server-only";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import { addTallies, emptyTally } from "@/lib/checks/release-check/tally";
import { select } from "@/lib/db";
import { enqueue } from "@/lib/jobs/enqueue";
import { casesOf } from "@/lib/release-checks/casesOf";
import { releaseCheckFingerprint } from "@/lib/release-checks/releaseCheckFingerprint";
import { Progress, ReleaseCheck, ReleaseCheckRun } from "@/models";
import type { TrialEngine, TriedSlice } from "./engine";
import { transact } from "./transact";

/** One job computes for so long and hands on to the next: none comes near the time after which it counts as lost. */
const JOB_MS = 60_000;

type Outcome = "finished" | "was finished" | "stopped" | "goes on" | "another is at it";

/**
 * Try the cases of one release check, slice by slice. Each slice is stored before the next is begun, and only onto the count it
 * began from: killed or run twice, at most one slice is lost and none is counted twice.
 */
export async function checkRelease(runId: string, engine: TrialEngine, now = () => new Date()): Promise<Outcome> {
  const until = now().getTime() + JOB_MS;
  for (;;) {
    const run = await ReleaseCheckRun.findByPk(runId);
    if (!run || run.finishedAt) return "was finished";
    if (run.stoppedAt) return "stopped";
    const slice = nextSlice(run);
    if (!slice) return finish(run, now());
    if (now().getTime() >= until) return handOn(run);
    const tried = await engine.trySlice({ plan: run.plan, baseSeedHex: baseSeedOf(run), ...slice });
    if (!(await store(run, slice.part, tried))) return "another is at it";
  }
}

/** The base of the seeds is worked out again: a run whose plan is another one would be stored under a false name. */
function baseSeedOf({ id, plan, fingerprint }: ReleaseCheckRun): string {
  if (releaseCheckFingerprint(plan) === fingerprint) return fingerprint;
  throw new Error(`checkRelease: run ${id} is of another plan or engine, this one is ${ENGINE_VERSION}`);
}

/** The whole cases last: what the quick ones show may be enough to stop it. */
function nextSlice({ plan, preview, tried, wholeTried }: ReleaseCheckRun) {
  const { cases, whole } = casesOf(plan, preview);
  if (tried < cases) return { part: "case" as const, from: tried, to: cases };
  return wholeTried < whole ? { part: "whole" as const, from: wholeTried, to: whole } : null;
}

async function store(run: ReleaseCheckRun, part: "case" | "whole", { tally, count }: TriedSlice): Promise<boolean> {
  const { id, tried, wholeTried } = run;
  const stored = await select<{ id: string }>(STORE, {
    ...{ id, tried, wholeTried, tally: JSON.stringify(addTallies(run.tally ?? emptyTally(), tally)) },
    more: part === "case" ? count : 0,
    moreWhole: part === "whole" ? count : 0,
  });
  // An earlier fault is forgotten, since the job runs again.
  if (stored.length > 0) await Progress.destroy({ where: { subjectId: id, job: "check-release" } });
  return stored.length > 0;
}

const handOn = (run: ReleaseCheckRun) =>
  transact(null, async (transaction): Promise<Outcome> => {
    await enqueue("check-release", { runId: run.id }, transaction);
    return "goes on";
  });

/** A preview stays where it is; a whole table becomes the record, and the working row goes. */
const finish = (run: ReleaseCheckRun, finishedAt: Date) =>
  transact({ personId: "", employerId: run.employerId }, async (transaction): Promise<Outcome> => {
    const { id, fingerprint, plan, tally } = run;
    if (run.preview) {
      await ReleaseCheckRun.update({ finishedAt }, { where: { id, finishedAt: null }, transaction });
      return "finished";
    }
    await ReleaseCheckRun.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
    if (await ReleaseCheck.count({ where: { fingerprint }, transaction })) return "was finished";
    const record = { fingerprint, plan, engineVersion: ENGINE_VERSION, tally: tally!, finishedAt };
    await ReleaseCheck.create(record, { transaction });
    await ReleaseCheckRun.destroy({ where: { id }, transaction });
    return "finished";
  });

const STORE = `
  UPDATE release_check_runs SET tally = :tally, tried = tried + :more, whole_tried = whole_tried + :moreWhole
  WHERE id = :id AND tried = :tried AND whole_tried = :wholeTried AND stopped_at IS NULL AND finished_at IS NULL
  RETURNING id`;
