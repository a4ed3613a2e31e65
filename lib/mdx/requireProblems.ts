import type { CheckPlan } from "@/lib/checks/kind";
import type { ParsedModule } from "@/lib/mdx/parsedModule";
import { problemAt, warningAt, type Problem } from "@/lib/mdx/problem";
import { plainAttribute, rangeOfAttribute, type WrittenCheck } from "@/lib/mdx/writtenTag";

/** `require` of the front matter against the checks of the text, both ways. */
export function requireProblems({ frontMatter, required, checks }: ParsedModule): Problem[] {
  const ids = checks.map(idOf).filter((id) => id !== null);
  const known = ids.length > 0 ? `Checks are ${ids.join(", ")}.` : "The text has no <Check>.";
  const missing = required.filter(({ id }) => !ids.includes(id));
  const unused = frontMatter ? checks.filter((check) => !required.some(({ id }) => id === idOf(check))) : [];
  return [
    ...missing.map(({ id, place }) => problemAt(place, "require", `No check is named "${id.slice(0, 40)}". ${known}`)),
    ...unused.flatMap((check) => {
      const id = idOf(check);
      if (id === null) return [];
      const message = `No rule requires the check "${id}": it would be sat and marked, and the outcome would not depend on it. Name it under require.`;
      return [warningAt(rangeOfAttribute(check, "id"), "unused", message)];
    }),
  ];
}

function idOf(check: WrittenCheck): CheckPlan["id"] | null {
  const id = plainAttribute(check, "Check", "id");
  return typeof id === "string" ? id : null;
}
