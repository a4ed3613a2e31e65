import "server-only";
import { InvalidError } from "@/lib/errors";
import { startingSource } from "@/lib/mdx/startingSource";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { Draft, Module } from "@/models";
import { transact } from "./transact";

/** Begin a module: an empty draft that already says what a module needs. */
export const createModule = (actor: Actor, { code, title }: { code: string; title: string }) =>
  transact(actor, async (transaction) => {
    authorize(can.writeModule(actor, actor), "write modules");
    const where = { employerId: actor.employerId, code };
    if (await Module.count({ where, transaction })) {
      const rule = `Your firm has a module ${code} already.`;
      throw new InvalidError(rule, { code: [rule] });
    }
    const created = await Module.create({ ...where, createdBy: actor.personId }, { transaction });
    const source = startingSource(code, title);
    await Draft.create({ moduleId: created.id, title, source, savedBy: actor.personId }, { transaction });
    return { id: created.id };
  });
