import "server-only";
import { NotFoundError } from "@/lib/errors";
import { checkCards, type CheckCardView } from "@/lib/mdx/checkCards";
import type { ModuleTree } from "@/lib/mdx/moduleTree";
import type { Problem } from "@/lib/mdx/problem";
import { readModule } from "@/lib/mdx/readModule";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { Module } from "@/models";
import { isId } from "./findOwn";

export type DraftReading = {
  problems: Problem[];
  tree: ModuleTree | null;
  checkCards: Record<string, CheckCardView>;
  title: string | null;
};

/** What a text would be as a module, for the person who writes it. */
export async function checkDraft(actor: Actor, moduleId: string, source: string): Promise<DraftReading> {
  authorize(can.writeModule(actor, actor), "write this module");
  const own = isId(moduleId) && (await Module.count({ where: { id: moduleId, employerId: actor.employerId } }));
  if (!own) throw new NotFoundError("module");
  const { problems, tree, checks, module: checked } = await readModule(source);
  return { problems, tree, checkCards: checkCards(checks), title: checked?.frontMatter.title ?? null };
}
