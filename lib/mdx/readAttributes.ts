import { readLiteral, type Literal } from "@/lib/mdx/literal";
import { LIMITS } from "@/lib/mdx/limits";
import type { TagAttribute } from "@/lib/mdx/nodes";
import { problemAt, type Place, type Problem, type Range } from "@/lib/mdx/problem";
import type { SourceText } from "@/lib/mdx/sourceText";

/** `textFrom` is where the text of a value in quotes begins, for faults inside it. */
export type WrittenAttribute = { name: string; value: Literal; range: Range; textFrom?: Place };

/** The attributes of one tag as written, each at most once; what cannot be a value is a problem and left out. */
export function readAttributes(
  attributes: readonly TagAttribute[],
  tagRange: Range,
  source: SourceText,
): { written: WrittenAttribute[]; problems: Problem[] } {
  const written: WrittenAttribute[] = [];
  const problems: Problem[] = [];
  for (const attribute of attributes) {
    const range = rangeOf(attribute) ?? tagRange;
    if (attribute.type === "mdxJsxExpressionAttribute") {
      problems.push(
        problemAt(
          range,
          "spread",
          'Attributes are written one by one: name="value". Braces stand only after the equals sign.',
        ),
      );
      continue;
    }
    const { name, value } = attribute;
    if (written.some((other) => other.name === name)) {
      problems.push(problemAt(range, "attribute", `${name} is written twice on this tag. Delete one.`));
    } else if (typeof value === "object" && value !== null) {
      const read = readLiteral(value.value);
      if ("value" in read) written.push({ name, value: read.value, range, ...textFrom(range, read.value, source) });
      else
        problems.push(
          problemAt(placeIn(range, value.value, read.offset, source), "attribute-value", `${name}: ${read.problem}`),
        );
    } else if (typeof value === "string" && value.length > LIMITS.attributeCharacters) {
      problems.push(
        problemAt(range, "attribute-value", `${name}: a value has at most ${LIMITS.attributeCharacters} characters.`),
      );
    } else {
      written.push({ name, value: value ?? true, range, ...textFrom(range, value, source) });
    }
  }
  return { written, problems };
}

/** Nothing where the parser changed the text on its way, as it does with `&amp;` and the indentation of a second line. */
function textFrom(range: Range, value: Literal | undefined, source: SourceText): { textFrom?: Place } {
  const within = typeof value === "string" && value !== "" ? source.slice(range).lastIndexOf(value) : -1;
  return within < 0 ? {} : { textFrom: source.placeAt(source.offsetAt(range.from) + within) };
}

export const rangeOf = (node: { position?: { start: Range["from"]; end: Range["from"] } }): Range | null =>
  node.position
    ? {
        from: { line: node.position.start.line, column: node.position.start.column },
        to: { line: node.position.end.line, column: node.position.end.column },
      }
    : null;

/** Where a part of an expression stands; the whole attribute when the parser took indentation out of the text. */
function placeIn(range: Range, expression: string, offset: number, source: SourceText): Range {
  const within = source.slice(range).indexOf(`{${expression}}`);
  if (within < 0) return range;
  return { from: source.placeAt(source.offsetAt(range.from) + within + 1 + offset), to: range.to };
}
