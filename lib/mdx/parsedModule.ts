import type { FrontMatter } from "@/lib/mdx/frontMatter";
import type { ModuleTree } from "@/lib/mdx/moduleTree";
import type { Place, Problem } from "@/lib/mdx/problem";
import type { WrittenCheck } from "@/lib/mdx/writtenTag";

/** What the text alone tells; the kinds of its checks are looked up later, outside the thread. Plain data. */
export type ParsedModule = {
  problems: Problem[];
  frontMatter: FrontMatter | null;
  required: { id: string; place: Place }[];
  checks: WrittenCheck[];
  tree: ModuleTree | null;
};

export const unread = (problems: Problem[]): ParsedModule => ({
  problems,
  frontMatter: null,
  required: [],
  checks: [],
  tree: null,
});
