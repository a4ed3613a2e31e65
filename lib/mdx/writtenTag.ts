import { attributeValue } from "@/lib/mdx/attributeValue";
import type { Range } from "@/lib/mdx/problem";
import type { WrittenAttribute } from "@/lib/mdx/readAttributes";
import { tagNamed, type TagName } from "@/lib/mdx/tags";

/** A `<Check>` or a tag inside it as written; what its kind allows is looked up outside the thread. */
export type WrittenTag = { range: Range; attributes: WrittenAttribute[] };
export type WrittenPart = WrittenTag & { tag: TagName };
export type WrittenCheck = WrittenTag & { parts: WrittenPart[] };

export const partsOf = (check: WrittenCheck, tag: TagName): WrittenPart[] =>
  check.parts.filter((one) => one.tag === tag);

/** Checked value of an attribute of the tag's own list; undefined when missing or refused, which the guard has reported. */
export function plainAttribute(tag: WrittenTag, tagName: TagName, name: string): string | number | boolean | undefined {
  const spec = tagNamed(tagName)?.attributes.find((one) => one.name === name);
  const written = tag.attributes.find((one) => one.name === name);
  if (!spec || !written) return undefined;
  const read = attributeValue(spec, written.value);
  return "value" in read ? read.value : undefined;
}

export const rangeOfAttribute = (tag: WrittenTag, name: string): Range =>
  tag.attributes.find((one) => one.name === name)?.range ?? tag.range;

/** Where a character of an attribute's text stands; the whole attribute where the text was not found as it is. */
export function placeInAttribute(tag: WrittenTag, name: string, offset: number): Range {
  const attribute = tag.attributes.find((one) => one.name === name);
  if (!attribute?.textFrom || typeof attribute.value !== "string") return rangeOfAttribute(tag, name);
  const before = attribute.value.slice(0, offset).split("\n");
  const { line, column } = attribute.textFrom;
  const last = before.at(-1)?.length ?? 0;
  const from =
    before.length === 1 ? { line, column: column + last } : { line: line + before.length - 1, column: last + 1 };
  return { from, to: attribute.range.to };
}
