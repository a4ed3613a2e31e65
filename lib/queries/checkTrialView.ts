import "server-only";
import type { CheckPlan } from "@/lib/checks/kind";
import type { LineVerdict } from "@/lib/checks/release-check/judgeTally";
import type { Failing, Tally } from "@/lib/checks/release-check/tally";
import { select } from "@/lib/db";
import { casesOf } from "@/lib/release-checks/casesOf";
import { linesOf, type JudgedCheck } from "@/lib/release-checks/judgeRelease";
import { releaseCheckFingerprint } from "@/lib/release-checks/releaseCheckFingerprint";
import { iso } from "./findOwn";

export type TrialTable = { lines: LineVerdict[]; failing: Failing[]; built: number; draws: number; mostDraws: number };

/** `state` waiting: the worker has not begun. */
export type TrialProgress = {
  state: "waiting" | "running" | "stopped" | "failed";
  tried: number;
  of: number;
  whole: number;
  ofWhole: number;
  /** A reference to give to the operator. */
  fault: string | null;
  /** Asked for by the own firm, which may stop it. */
  own: boolean;
};

export type CheckTrialView = {
  id: string;
  title: string;
  kind: string;
  /** False where people judge: such a check needs no release check. */
  needed: boolean;
  within: boolean;
  result: (TrialTable & { finishedAt: string; engineVersion: string }) | null;
  run: TrialProgress | null;
  /** A look at fewer cases: the table once it has finished, until then how far it is. */
  preview: { table: TrialTable | null; progress: TrialProgress } | null;
};

type ResultRow = { fingerprint: string; tally: Tally; engineVersion: string; finishedAt: Date };
type RunRow = {
  fingerprint: string;
  preview: boolean;
  tried: number;
  wholeTried: number;
  tally: Tally | null;
  stopped: boolean;
  finished: boolean;
  own: boolean;
  fault: string | null;
};

export const resultsOf = (plans: readonly CheckPlan[]): Promise<ResultRow[]> =>
  plans.length === 0
    ? Promise.resolve([])
    : select<ResultRow>(RESULTS, { fingerprints: plans.map(releaseCheckFingerprint) });

export const runsOf = (checks: readonly JudgedCheck[], employerId: string): Promise<RunRow[]> => {
  const fingerprints = checks.flatMap(({ fingerprint }) => fingerprint ?? []);
  return fingerprints.length === 0 ? Promise.resolve([]) : select<RunRow>(RUNS, { fingerprints, employerId });
};

export function checkTrialView(
  { plan, fingerprint, lines, within }: JudgedCheck,
  results: readonly ResultRow[],
  runs: readonly RunRow[],
): CheckTrialView {
  const result = results.find((row) => row.fingerprint === fingerprint);
  const run = runs.find((row) => row.fingerprint === fingerprint && !row.preview);
  const preview = runs.find((row) => row.fingerprint === fingerprint && row.preview);
  return {
    id: plan.id,
    title: plan.title,
    kind: plan.kind,
    needed: fingerprint !== null,
    within,
    result:
      result && lines
        ? { ...tableOf(lines, result.tally), finishedAt: iso(result.finishedAt), engineVersion: result.engineVersion }
        : null,
    run: run && !result ? progressOf(plan, run) : null,
    preview: preview
      ? {
          table: preview.finished && preview.tally ? tableOf(linesOf(plan, preview.tally), preview.tally) : null,
          progress: progressOf(plan, preview),
        }
      : null,
  };
}

const tableOf = (lines: LineVerdict[], { failing, built, draws, mostDraws }: Tally): TrialTable => ({
  ...{ lines, failing, built, draws, mostDraws },
});

function progressOf(plan: CheckPlan, { preview, tried, wholeTried, stopped, fault, own }: RunRow): TrialProgress {
  const { cases, whole } = casesOf(plan, preview);
  const state = fault ? "failed" : stopped ? "stopped" : tried > 0 ? "running" : "waiting";
  return { state, tried, of: cases, whole: wholeTried, ofWhole: whole, fault, own };
}

const RESULTS = `
  SELECT fingerprint, tally, engine_version AS "engineVersion", finished_at AS "finishedAt" FROM release_checks
  WHERE fingerprint IN (:fingerprints)`;
const RUNS = `
  SELECT r.fingerprint, r.preview, r.tried, r.whole_tried AS "wholeTried", r.tally, r.stopped_at IS NOT NULL AS stopped,
    r.finished_at IS NOT NULL AS finished, r.employer_id = :employerId AS own, p.fault
  FROM release_check_runs r LEFT JOIN progress p ON p.subject_id = r.id AND p.job = 'check-release'
  WHERE r.fingerprint IN (:fingerprints)`;
