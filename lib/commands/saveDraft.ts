import "server-only";
import { QueryTypes } from "sequelize";
import { db } from "@/lib/db";
import { ConflictError, InvalidError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { lockOwnModule } from "./lockOwn";
import { transact } from "./transact";

const MAX_SOURCE_BYTES = 65_536;

type DraftText = { moduleId: string; source: string; title: string; revision: number };

/**
 * Keep the text of a draft, faults and all.
 * @param revision what the writer last saw; another writer's newer text is never overwritten
 */
export const saveDraft = (actor: Actor, { moduleId, source, title, revision }: DraftText, now = new Date()) =>
  transact(actor, async (transaction) => {
    const { module, draft } = await lockOwnModule(actor, moduleId, transaction);
    authorize(can.writeModule(actor, module), "write this module");
    if (Buffer.byteLength(source) > MAX_SOURCE_BYTES) throw new InvalidError("A module may be 64 kB long.");
    if (source === draft.source) return { revision: draft.revision, savedAt: draft.savedAt.toISOString() };
    if (revision !== draft.revision) {
      throw new ConflictError(
        "Somebody else saved this module meanwhile. Your text is kept here; load theirs to compare.",
      );
    }
    const saved = { source, title, revision: revision + 1, savedBy: actor.personId, savedAt: now };
    await draft.update(saved, { transaction });
    const replacements = { moduleId, personId: actor.personId };
    await db.query(NOTE_WRITER, { replacements, transaction, type: QueryTypes.INSERT });
    return { revision: saved.revision, savedAt: now.toISOString() };
  });

const NOTE_WRITER = `INSERT INTO draft_writers (module_id, person_id) VALUES (:moduleId, :personId) ON CONFLICT DO NOTHING`;
