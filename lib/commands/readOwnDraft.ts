import "server-only";
import { ConflictError, NotFoundError } from "@/lib/errors";
import type { CheckedModule } from "@/lib/mdx/moduleReading";
import { readModule } from "@/lib/mdx/readModule";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { Draft, Module } from "@/models";
import { requireId } from "./lockOwn";

/** A draft without a fault, for whoever may release it. Parsing takes its own thread and time: before any lock is held. */
export async function readOwnDraft(actor: Actor, moduleId: string): Promise<CheckedModule> {
  requireId(moduleId, "module");
  const own = await Module.count({ where: { id: moduleId, employerId: actor.employerId } });
  const draft = own ? await Draft.findByPk(moduleId) : null;
  if (!draft) throw new NotFoundError("module");
  authorize(can.releaseModule(actor, actor), "release this module");
  const { module, problems } = await readModule(draft.source);
  if (module) return module;
  const errors = problems.filter((problem) => problem.severity === "error");
  throw new ConflictError(`${errors.length === 1 ? "1 error" : `${errors.length} errors`} to fix first.`);
}
