import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { completions, type Completions } from "@/lib/mdx/completions";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { iso, isId } from "./findOwn";

type Row = {
  id: string;
  code: string;
  title: string;
  source: string;
  revision: number;
  savedAt: Date;
  savedBy: string;
};

export type ReleaseLine = {
  id: string;
  number: string;
  kind: string;
  fingerprint: string;
  reason: string;
  releasedBy: string;
  releasedAt: string;
  isDraft: boolean;
};
export type ModuleView = Omit<Row, "savedAt"> & {
  savedAt: string;
  releases: ReleaseLine[];
  /** What the module language has, for whoever writes. */
  completions: Completions;
};

/** A module's draft and its releases, newest first; null when the employer has no such module. */
export async function getModule(actor: Actor, id: string): Promise<ModuleView | null> {
  authorize(can.readModules(actor, actor), "read the modules");
  if (!isId(id)) return null;
  const [row] = await select<Row>(DRAFT, { id, employerId: actor.employerId });
  if (!row) return null;
  const releases = await select<Omit<ReleaseLine, "releasedAt"> & { releasedAt: Date }>(RELEASES, { id });
  return {
    ...row,
    savedAt: iso(row.savedAt),
    completions: completions(),
    releases: releases.map((release) => ({ ...release, releasedAt: iso(release.releasedAt) })),
  };
}

const DRAFT = `
  SELECT m.id, m.code, d.title, d.source, d.revision, d.saved_at AS "savedAt", p.name AS "savedBy"
  FROM modules m JOIN drafts d ON d.module_id = m.id JOIN people p ON p.id = d.saved_by
  WHERE m.id = :id AND m.employer_id = :employerId`;
const RELEASES = `
  SELECT r.id, r.number, r.kind, r.fingerprint, r.reason, p.name AS "releasedBy", r.released_at AS "releasedAt",
    r.source = d.source AS "isDraft"
  FROM releases r JOIN people p ON p.id = r.released_by JOIN drafts d ON d.module_id = r.module_id
  WHERE r.module_id = :id ORDER BY r.released_at DESC`;
