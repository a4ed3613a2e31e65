import { attributeValue } from "@/lib/mdx/attributeValue";
import type { Range } from "@/lib/mdx/problem";
import type { WrittenAttribute } from "@/lib/mdx/readAttributes";
import { tagNamed, type TagName } from "@/lib/mdx/tags";

/** A `<Check>` or `<Quantity>` as written; what its kind allows is looked up outside the thread. */
export type WrittenTag = { range: Range; attributes: WrittenAttribute[] };
export type WrittenCheck = WrittenTag & { quantities: WrittenTag[] };

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
