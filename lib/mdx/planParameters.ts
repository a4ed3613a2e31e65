import type { CheckKind } from "@/lib/checks/kind";
import { readParameters, type ReadParameters } from "@/lib/checks/readParameters";
import { problemAt, type Problem } from "@/lib/mdx/problem";
import type { WrittenAttribute } from "@/lib/mdx/readAttributes";

/** All parameters of a kind by name: as written on the check, else as the kind has them. */
export function planParameters(
  kind: CheckKind,
  written: readonly WrittenAttribute[],
): { values: ReadParameters["parameters"]; problems: Problem[] } {
  const { parameters, problems } = readParameters(
    kind.parameters,
    // A record made this way has `__proto__` as an own name, should a lead write it.
    Object.fromEntries(written.map(({ name, value }) => [name, value])),
  );
  return {
    values: parameters,
    problems: problems.flatMap(({ name, message }) => {
      const range = written.find((one) => one.name === name)?.range;
      // Handlers have been refused already, with better words.
      return range && !/^on[A-Z]/.test(name) ? [problemAt(range, "attribute-value", message)] : [];
    }),
  };
}
