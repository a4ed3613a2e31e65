import type { CheckKind } from "@/lib/checks/kind";
import { readParameters, type ReadParameters } from "@/lib/checks/readParameters";
import { problemAt, type Problem, type Range } from "@/lib/mdx/problem";
import type { WrittenAttribute } from "@/lib/mdx/readAttributes";

/**
 * All parameters of a kind by name: as written on the check, else as the kind has them.
 * @param check where the tag stands, for a problem with what is not written
 */
export function planParameters(
  kind: CheckKind,
  written: readonly WrittenAttribute[],
  check: Range,
): { values: ReadParameters["parameters"]; problems: Problem[] } {
  const { parameters, problems } = readParameters(
    kind.parameters,
    // A record made this way has `__proto__` as an own name, should a lead write it.
    Object.fromEntries(written.map(({ name, value }) => [name, value])),
  );
  const rangeOf = (name: string) => written.find((one) => one.name === name)?.range;
  // Each in its range, they may still leave nothing to draw from; a default may be the one that does not fit.
  const together = problems.length === 0 ? kind.parametersProblem?.(parameters) : null;
  return {
    values: parameters,
    problems: [
      ...problems.flatMap(({ name, message }) => {
        const range = rangeOf(name);
        // Handlers have been refused already, with better words.
        return range && !/^on[A-Z]/.test(name) ? [problemAt(range, "attribute-value", message)] : [];
      }),
      ...(together ? [problemAt(rangeOf(together.name) ?? check, "attribute-value", together.message)] : []),
    ],
  };
}
