import type { CheckKind } from "@/lib/checks/kind";
import { KINDS } from "@/lib/checks/registry";
import type { ModuleReading } from "@/lib/mdx/moduleReading";
import { parseInThread } from "@/lib/mdx/parseInThread";
import { planChecks } from "@/lib/mdx/planChecks";
import { inOrder, LISTED_PROBLEMS } from "@/lib/mdx/problem";
import { requireProblems } from "@/lib/mdx/requireProblems";

/** Everything that can be said of the source of a module, and the module itself when nothing is wrong with it. */
export async function readModule(source: string, kinds: readonly CheckKind[] = KINDS): Promise<ModuleReading> {
  const parsed = await parseInThread(source.replace(/^\uFEFF/, ""));
  const { frontMatter, tree } = parsed;
  const { plans, problems } = planChecks(parsed.checks, kinds);
  const found = inOrder([...parsed.problems, ...problems, ...(tree ? requireProblems(parsed) : [])]);
  const sound = frontMatter !== null && tree !== null && found.every(({ severity }) => severity !== "error");
  return {
    problems: found.slice(0, LISTED_PROBLEMS),
    module: sound ? { frontMatter, checks: plans, tree } : null,
    checks: plans,
    tree,
  };
}
