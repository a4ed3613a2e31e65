import type { CompletionRow, Completions } from "@/lib/mdx/completions";

/** Offers for the place after a text; labels begin as what is typed does. `from` is where the word begins that they would replace. */
export type Offers = { from: number; rows: readonly CompletionRow[] };

/**
 * What can be written at the end of a text: keys of the front matter, names of tags, attributes of an open tag; inside a
 * `<Check>` the attributes of its kind and, between its tags, the kind's quantities.
 * @returns null where the text is the lead's own
 */
export function offersAt(completions: Completions, before: string): Offers | null {
  const word = /[\w-]*$/.exec(before)![0];
  const from = before.length - word.length;
  if (inFrontMatter(before)) {
    const atLineStart = /(^|\n)[\w-]*$/.test(before);
    return atLineStart ? { from, rows: completions.frontMatter } : null;
  }
  const kind = kindOfOpenCheck(before);
  const opening = /<(\w*)$/.exec(before);
  if (opening) {
    const quantities = kind ? (completions.quantities[kind] ?? []) : [];
    return {
      from: opening.index,
      rows: [
        ...(kind ? (completions.ownTags[kind] ?? []) : []),
        ...quantities.map((row) => ({ ...row, label: `<Quantity ${row.label}` })),
        ...completions.tags.map((row) => ({ ...row, label: `<${row.label}` })),
      ],
    };
  }
  const tag = openTag(before);
  if (!tag || !/\s[\w-]*$/.test(before)) return null;
  const own = completions.attributes[tag.name as keyof Completions["attributes"]] ?? [];
  const ofKind = tag.name === "Check" ? [...(kind ? [] : completions.kinds), ...kindRows(completions, kind)] : [];
  const written = new Set([...tag.text.matchAll(/([\w-]+)=/g)].map(([, name]) => name));
  return { from, rows: [...ofKind, ...own].filter(({ label }) => !written.has(label)) };
}

const kindRows = (completions: Completions, kind: string | null) =>
  kind ? (completions.kindAttributes[kind] ?? []) : [];

/** Between the first line of three hyphens and the next. */
const inFrontMatter = (before: string) => /^---\n/.test(before) && !/\n---(\n|$)/.test(before.slice(3));

/** The tag whose attributes are being written, as far as it stands; braces and quotes that are open belong to a value. */
function openTag(before: string): { name: string; text: string } | null {
  const tag = /<(\w+)((?:"[^"]*"|\{[^}]*\}|[^<>"{}])*)$/.exec(before);
  return tag ? { name: tag[1]!, text: tag[2]! } : null;
}

/** The kind of the check that has begun and not ended; null when there is none or it is not named yet. */
function kindOfOpenCheck(before: string): string | null {
  const begun = before.lastIndexOf("<Check");
  if (begun < 0 || before.lastIndexOf("</Check>") > begun) return null;
  return /\skind="([\w-]+)"/.exec(before.slice(begun))?.[1] ?? null;
}
