import "server-only";
import { select } from "@/lib/db";
import { InvalidError } from "@/lib/errors";
import { startingSource } from "@/lib/mdx/startingSource";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { Draft } from "@/models";
import { transact } from "./transact";

/** Begin a module: an empty draft that already says what a module needs. */
export const createModule = (actor: Actor, { code, title }: { code: string; title: string }) =>
  transact(actor, async (transaction) => {
    authorize(can.writeModule(actor, actor), "write modules");
    const { employerId, personId } = actor;
    const [created] = await select<{ id: string }>(ADD_UNLESS_KNOWN, { employerId, code, personId }, transaction);
    if (!created) {
      const rule = `Your firm has a module ${code} already.`;
      throw new InvalidError(rule, { code: [rule] });
    }
    const source = startingSource(code, title);
    await Draft.create({ moduleId: created.id, title, source, savedBy: personId }, { transaction });
    return { id: created.id };
  });

const ADD_UNLESS_KNOWN = `
  INSERT INTO modules (employer_id, code, created_by) VALUES (:employerId, :code, :personId)
  ON CONFLICT (employer_id, code) DO NOTHING RETURNING id`;
