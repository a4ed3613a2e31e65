import type { ModuleTree, TreeElement } from "@/lib/mdx/moduleTree";

/** The text inside a `<Check>` of a stored tree, as a tree of its own; null where there is none. */
export const briefOf = (check: TreeElement | null): ModuleTree | null =>
  check && check.children.length > 0 ? { type: "root", children: check.children } : null;
