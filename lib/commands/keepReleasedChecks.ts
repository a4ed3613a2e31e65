import "server-only";
import type { Transaction } from "sequelize";
import { select } from "@/lib/db";
import { ConflictError, InvalidError } from "@/lib/errors";
import type { CheckedModule } from "@/lib/mdx/moduleReading";
import { judgeRelease, type JudgedCheck } from "@/lib/release-checks/judgeRelease";
import { releaseCheckFingerprint } from "@/lib/release-checks/releaseCheckFingerprint";
import type { Tally } from "@/lib/checks/release-check/tally";
import { ReleasedCheck } from "@/models";

/** Why a lead releases what is outside its bounds: by check, and for the sitting as a whole. */
export type ReleaseReasons = { checks: Readonly<Record<string, string>>; sitting: string };

type Kept = Pick<ReleasedCheck, "checkId" | "releaseCheckId" | "within" | "reason">;

/**
 * What a release would rely on.
 * @throws ConflictError while a check has no finished release check
 * @throws InvalidError where one is outside its bounds and the lead gave no reason
 */
export async function releasedChecks(
  { checks: plans, frontMatter }: CheckedModule,
  reasons: ReleaseReasons,
  transaction: Transaction,
): Promise<Kept[]> {
  const found = await select<Found>(FOUND, { fingerprints: plans.map(releaseCheckFingerprint) }, transaction);
  const byFingerprint = new Map(found.map((row) => [row.fingerprint, row]));
  const tallies = new Map(found.map(({ fingerprint, tally }) => [fingerprint, tally]));
  const { checks, sitting } = judgeRelease(plans, frontMatter, tallies);
  refuseUnfinished(checks);
  const kept = checks.map(({ plan, fingerprint, within }) => ({
    checkId: plan.id,
    releaseCheckId: fingerprint === null ? null : byFingerprint.get(fingerprint)!.id,
    within,
    reason: within ? "" : reasonOf(reasons.checks, plan.id),
  }));
  const within = sitting!.guessedWithin;
  const whole = { checkId: null, releaseCheckId: null, within, reason: within ? "" : reasons.sitting.trim() };
  refuseWithoutReason([...kept, whole]);
  return [...kept, whole];
}

export async function keepReleasedChecks(releaseId: string, kept: readonly Kept[], transaction: Transaction) {
  for (const one of kept) await ReleasedCheck.create({ releaseId, ...one }, { transaction });
}

const reasonOf = (reasons: ReleaseReasons["checks"], id: string) =>
  Object.hasOwn(reasons, id) ? reasons[id]!.trim() : "";

function refuseUnfinished(checks: readonly JudgedCheck[]): void {
  const names = checks.filter(({ fingerprint, lines }) => fingerprint !== null && lines === null).map(quoted);
  if (names.length > 0) throw new ConflictError(`The release check of ${names.join(", ")} has not finished.`);
}

const quoted = ({ plan }: JudgedCheck) => `"${plan.id}"`;

function refuseWithoutReason(kept: readonly Kept[]): void {
  const missing = kept.filter(({ within, reason }) => !within && reason === "");
  if (missing.length === 0) return;
  const names = missing.map(({ checkId }) => (checkId === null ? "the sitting as a whole" : `"${checkId}"`));
  throw new InvalidError(`Outside its bounds: ${names.join(", ")}. Give a reason, or change the draft.`);
}

type Found = { id: string; fingerprint: string; tally: Tally };
const FOUND = `SELECT id, fingerprint, tally FROM release_checks WHERE fingerprint IN (:fingerprints)`;
