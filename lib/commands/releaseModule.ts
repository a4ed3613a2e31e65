import "server-only";
import { QueryTypes, type Transaction } from "sequelize";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { db, select } from "@/lib/db";
import { ConflictError, InvalidError } from "@/lib/errors";
import type { CheckedModule } from "@/lib/mdx/moduleReading";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { Release } from "@/models";
import type { ReleaseKind } from "@/models/Release";
import { keepReleasedChecks, releasedChecks, type ReleaseReasons } from "./keepReleasedChecks";
import { lockOwnModule } from "./lockOwn";
import { readOwnDraft } from "./readOwnDraft";
import { transact } from "./transact";

type ReleaseOrder = {
  moduleId: string;
  revision: number;
  kind: Exclude<ReleaseKind, "first">;
  reason: string;
  /** Asked only for what is outside the bounds of the release check. */
  outside: ReleaseReasons;
};

/** Freeze the draft as the next numbered release. */
export async function releaseModule(actor: Actor, order: ReleaseOrder) {
  const checked = await readOwnDraft(actor, order.moduleId);
  return transact(actor, async (transaction) => {
    const { module, draft } = await lockOwnModule(actor, order.moduleId, transaction);
    authorize(can.releaseModule(actor, module), "release this module");
    // The text was read before the lock; a later text has not been checked.
    if (draft.revision !== order.revision)
      throw new ConflictError("The draft was changed meanwhile. Look at it again.");
    if (checked.frontMatter.code !== module.code) {
      throw new InvalidError(`The front matter says ${checked.frontMatter.code}, but this module is ${module.code}.`);
    }
    const last = await lastRelease(module.id, transaction);
    if (last?.source === draft.source) throw new ConflictError(`Nothing changed since release ${last.number}.`);
    const kept = await releasedChecks(checked, order.outside, transaction);
    const number = nextNumber(last?.number, order.kind);
    const release = await Release.create(
      {
        moduleId: module.id,
        employerId: module.employerId,
        number,
        kind: last ? order.kind : "first",
        title: checked.frontMatter.title,
        source: draft.source,
        ...checked,
        fingerprint: fingerprintOf(canonicalRelease(actor.employerSlug, module.code, number, draft.source, checked)),
        reason: order.reason,
        releasedBy: actor.personId,
      },
      { transaction },
    );
    const replacements = { releaseId: release.id, moduleId: module.id, personId: actor.personId };
    await db.query(NOTE_HANDS, { replacements, transaction, type: QueryTypes.INSERT });
    await keepReleasedChecks(release.id, kept, transaction);
    return { id: release.id, number, fingerprint: release.fingerprint };
  });
}

async function lastRelease(moduleId: string, transaction: Transaction) {
  const [last] = await select<{ number: string; source: string }>(LAST_RELEASE, { moduleId }, transaction);
  return last;
}

/** Editorial and minor releases count up the second number, a major one the first. */
export function nextNumber(last: string | undefined, kind: ReleaseKind): string {
  if (!last) return "1.0";
  const [major, minor] = last.split(".").map(Number) as [number, number];
  return kind === "major" ? `${major + 1}.0` : `${major}.${minor + 1}`;
}

// The tree follows from the source; hashing both would only make the record depend on the parser's version.
const canonicalRelease = (employer: string, code: string, number: string, source: string, module: CheckedModule) => ({
  schema: "lagmark-release-1",
  employer,
  code,
  number,
  source,
  frontMatter: module.frontMatter,
  checks: module.checks,
});

const LAST_RELEASE = `SELECT number, source FROM releases WHERE module_id = :moduleId ORDER BY released_at DESC LIMIT 1`;
// The person who began the module without changing a word wrote nothing; whoever saved a text wrote.
const NOTE_HANDS = `
  INSERT INTO release_writers (release_id, person_id, part)
  SELECT :releaseId::uuid, w.person_id, 'wrote' FROM draft_writers w WHERE w.module_id = :moduleId
  UNION ALL SELECT :releaseId::uuid, :personId::uuid, 'released'`;
