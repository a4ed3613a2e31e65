import type { Nodes } from "mdast";
import { attributeValue } from "@/lib/mdx/attributeValue";
import type { GuardContext } from "@/lib/mdx/guard";
import { htmlAdvice } from "@/lib/mdx/htmlAdvice";
import type { TreeProperty } from "@/lib/mdx/moduleTree";
import type { Tag } from "@/lib/mdx/nodes";
import { problemAt, type Range } from "@/lib/mdx/problem";
import { readAttributes, type WrittenAttribute } from "@/lib/mdx/readAttributes";
import { LATER_TAGS, TAGS, tagNamed, type TagName, type TagSpec } from "@/lib/mdx/tags";
import type { WrittenCheck } from "@/lib/mdx/writtenTag";

/** Name, place, inside and attributes of one tag. What passes is entered in `kept` and, for checks, in `checks`. */
export function guardTag(node: Tag, range: Range, ancestors: readonly Nodes[], context: GuardContext): void {
  const opening = openingOf(node, range);
  const refuse = (rule: string, message: string) => void context.problems.push(problemAt(opening, rule, message));
  const spec = node.name === null ? null : tagNamed(node.name);
  const { written, problems } = readAttributes(node.attributes, opening, context.source);
  context.problems.push(...problems);
  if (!spec) return refuse(...nameFault(node.name));

  const check = context.checks.at(-1);
  const misplaced = placeFault(node, spec, ancestors);
  if (misplaced) refuse("place", misplaced);
  if (spec.inside === "nothing" && node.children.length > 0) {
    refuse("inside", `<${spec.name}> has nothing inside. End it with /> and put the text before or after it.`);
  }
  const properties = readProperties(spec, written, opening, context);
  if (spec.name === "Check") {
    const started: WrittenCheck = { range: opening, attributes: written, parts: [] };
    context.checks.push(started);
    if (!misplaced && typeof properties.id === "string") context.kept.set(node, { id: properties.id });
  } else if (spec.place === "check") {
    // Quantities and the like belong to the card of their check and not to the text of the brief.
    if (!misplaced) check?.parts.push({ tag: spec.name as TagName, range: opening, attributes: written });
  } else if (!misplaced) {
    context.kept.set(node, properties);
  }
}

function openingOf(node: Tag, range: Range): Range {
  const length = `<${node.name ?? ""}`.length;
  return { from: range.from, to: { line: range.from.line, column: range.from.column + length } };
}

function nameFault(name: string | null): [rule: string, message: string] {
  if (name === null) return ["fragment", "<> and </> are not read. Delete them; the text inside stays."];
  if (LATER_TAGS.includes(name)) return ["not-available", `<${name}> is not available in this release. ${KNOWN}`];
  const meant = Object.keys(TAGS).find((known) => known.toLowerCase() === name.toLowerCase());
  if (meant) return ["tag", `Write <${meant}>: capital and small letters count in the name of a tag.`];
  const advice = htmlAdvice(name);
  if (advice) return ["html", `<${name.toLowerCase()}> is HTML, which is not read. ${advice}`];
  return ["tag", `<${name.slice(0, 40)}> is not a tag of the module language. ${KNOWN}`];
}

const KNOWN = `Tags are ${Object.keys(TAGS)
  .map((name) => `<${name}>`)
  .join(", ")}; HTML is not read.`;

function placeFault(node: Tag, spec: TagSpec, ancestors: readonly Nodes[]): string | null {
  const name = `<${spec.name}>`;
  const tags = ancestors.flatMap((one) => ("name" in one && one.type.startsWith("mdxJsx") ? [one.name] : []));
  if (spec.place === "check" && !tags.includes("Check"))
    return `${name} stands inside <Check> ... </Check>, which it belongs to.`;
  if (spec.place === "top" && ancestors.length > 0) {
    return `${name} stands on a line of its own, outside lists, quotations and other tags.`;
  }
  if (spec.inside === "nothing" && spec.place === "block" && tags.includes("Check")) {
    return `${name} does not stand inside <Check>. Put it before or after the check; the bench is open to the technician anyway.`;
  }
  if (tags.includes("Caution")) return `${name} does not stand inside <Caution>, which holds text only.`;
  // Alone on its line the parser makes a block of it; here it is part of a sentence, a heading or a table.
  if (node.type === "mdxJsxTextElement") return `${name} stands on a line of its own, not within a line of text.`;
  return null;
}

/** Checked values of the attributes in the tag's own list; the others of a check are left to its kind. */
function readProperties(
  spec: TagSpec,
  written: readonly WrittenAttribute[],
  opening: Range,
  { problems }: GuardContext,
): Record<string, TreeProperty> {
  const properties: Record<string, TreeProperty> = {};
  for (const { name, value, range } of written) {
    const attribute = spec.attributes.find((one) => one.name === name);
    if (attribute) {
      const read = attributeValue(attribute, value);
      if ("value" in read) properties[name] = read.value;
      else problems.push(problemAt(range, "attribute-value", read.problem));
    } else if (/^on[A-Z]/.test(name)) {
      problems.push(
        problemAt(range, "attribute", `${name} would run a program, and nothing in a module runs. Delete it.`),
      );
    } else if (!spec.kindAttributes) {
      problems.push(problemAt(range, "attribute", unknownAttribute(spec, name)));
    }
  }
  for (const { name, required, sample } of spec.attributes) {
    if (!required || written.some((one) => one.name === name)) continue;
    problems.push(
      problemAt(opening, "attribute", `<${spec.name}> needs ${name}. Write, for instance, ${name}=${sample}.`),
    );
  }
  return properties;
}

function unknownAttribute(spec: TagSpec, name: string): string {
  const known = spec.attributes.map((one) => one.name).join(", ");
  return `<${spec.name}> has no attribute ${name.slice(0, 40)}. It has ${known}.`;
}
