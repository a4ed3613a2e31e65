import type { CheckPlan } from "@/lib/checks/kind";
import type { FrontMatter } from "@/lib/mdx/frontMatter";
import type { ModuleTree } from "@/lib/mdx/moduleTree";
import type { Problem } from "@/lib/mdx/problem";

/** A module without a fault: all that a release stores of it. */
export type CheckedModule = { frontMatter: FrontMatter; checks: CheckPlan[]; tree: ModuleTree };

export type ModuleReading = {
  problems: Problem[];
  /** Null as long as there is one error; warnings do not count. */
  module: CheckedModule | null;
  /** For the preview: the checks that could be planned, also while something else is wrong. */
  checks: CheckPlan[];
  /** For the preview: what could be read, without the refused parts; null when the source could not be parsed. */
  tree: ModuleTree | null;
};
