import { MOST_LINES, type WrittenLine } from "@/lib/checks/written/parameters";
import { OwnPart, tooMany } from "@/lib/mdx/ownPart";
import type { OwnPlan } from "@/lib/mdx/ownPlans";
import { ownTitle } from "@/lib/mdx/ownTitle";
import { problemAt, type Problem } from "@/lib/mdx/problem";
import { partsOf, type WrittenCheck } from "@/lib/mdx/writtenTag";

/** The lines of a check of kind `written`: one `<Quantity>` each. */
export function planWritten(check: WrittenCheck): OwnPlan {
  const parts = partsOf(check, "Quantity");
  const problems: Problem[] = tooMany(parts, MOST_LINES);
  const lines: WrittenLine[] = [];
  for (const written of parts.slice(0, MOST_LINES)) {
    const part = new OwnPart(written);
    if (part.requireOnly(["id", "label"], ["critical"])) {
      const line: WrittenLine = { id: part.text("id"), label: part.label(), critical: part.isFlagged("critical") };
      if (lines.some(({ id }) => id === line.id))
        part.refuse("id", `"${line.id}" is used twice in this check. Choose another id.`);
      lines.push(line);
    }
    problems.push(...part.problems);
  }
  for (const { tag, range } of check.parts) {
    if (tag === "Quantity") continue;
    problems.push(
      problemAt(
        range,
        "own-quantity",
        `<${tag}> is not read in a check of this kind: nothing is drawn and nothing computed. Delete it.`,
      ),
    );
  }
  if (parts.length === 0) {
    const message =
      'A check of kind "written" needs a <Quantity> for each line that is judged. Write, for instance, <Quantity id="cause" label="what you think the cause is" />.';
    problems.push(problemAt(check.range, "own-quantity", message));
  }
  return {
    title: ownTitle(lines),
    parameters: { lines },
    quantities: lines.map(({ id, critical }) => ({ of: id, tolerance: null, critical })),
    problems,
  };
}
