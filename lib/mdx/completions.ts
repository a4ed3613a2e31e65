import { formatUnderstood } from "@/lib/checks/formatUnderstood";
import type { CheckKind, ParameterSpec, QuantityDefinition } from "@/lib/checks/kind";
import { KINDS } from "@/lib/checks/registry";
import { FRONT_MATTER_EXAMPLES } from "@/lib/mdx/frontMatter";
import { TAGS, type TagName, type TagSpec } from "@/lib/mdx/tags";
import { OWN_TAGS } from "@/lib/mdx/ownTags";
import { toleranceText } from "@/lib/mdx/toleranceText";

/** One offer of the editor: `insert` is what is typed for the lead. */
export type CompletionRow = { label: string; detail: string; insert: string };

/** Everything a lead can write, by the place where it can be written. Plain data for an editor or a printed reference. */
export type Completions = {
  frontMatter: CompletionRow[];
  tags: CompletionRow[];
  attributes: Record<TagName, CompletionRow[]>;
  kinds: CompletionRow[];
  /** Attributes of `<Check>` and values of `of`, by kind. */
  kindAttributes: Record<string, CompletionRow[]>;
  quantities: Record<string, CompletionRow[]>;
  /** By kind that leaves them to the lead: the tags inside its `<Check>`, together a whole check. */
  ownTags: Readonly<Record<string, CompletionRow[]>>;
};

export function completions(kinds: readonly CheckKind[] = KINDS): Completions {
  const specs: readonly TagSpec[] = Object.values(TAGS);
  // Newest of a kind first: that is the version a module gets.
  const newest = kinds.filter((kind, at) => kinds.findIndex(({ id }) => id === kind.id) === at);
  return {
    frontMatter: Object.entries(FRONT_MATTER_EXAMPLES)
      .filter(([path]) => !path.includes("."))
      .map(([label, insert]) => ({ label, detail: "front matter", insert })),
    tags: specs.map((spec) => ({ label: spec.name, detail: spec.help, insert: example(spec) })),
    attributes: Object.fromEntries(
      specs.map(({ name, attributes }) => [
        name,
        attributes.map((one) => ({ label: one.name, detail: one.help, insert: `${one.name}=${one.sample}` })),
      ]),
    ) as Completions["attributes"],
    kinds: newest.map(({ id, letter, title }) => ({
      label: id,
      detail: `${letter} ${title}`.trim(),
      insert: `kind="${id}"`,
    })),
    kindAttributes: Object.fromEntries(newest.map((kind) => [kind.id, kind.parameters.map(parameterRow)])),
    quantities: Object.fromEntries(newest.map((kind) => [kind.id, kind.quantities.map(quantityRow)])),
    ownTags: OWN_TAGS,
  };
}

function example({ name, attributes, inside }: TagSpec): string {
  const needed = attributes.filter((one) => "required" in one);
  const written = (needed.length > 0 ? needed : attributes).map((one) => ` ${one.name}=${one.sample}`).join("");
  return inside === "text" && name === "Check" ? `<${name}${written}>\n\n</${name}>` : `<${name}${written} />`;
}

function parameterRow(spec: ParameterSpec): CompletionRow {
  const value =
    spec.input === "choice"
      ? `"${spec.default}"`
      : spec.input === "number"
        ? `{${spec.default}}`
        : `{[${spec.default.join(", ")}]}`;
  const range =
    spec.input === "choice" ? "" : ` ${formatUnderstood(spec.from, "1")} to ${formatUnderstood(spec.to, spec.unit)}.`;
  return { label: spec.name, detail: `${spec.help}${range}`, insert: `${spec.name}=${value}` };
}

function quantityRow({ id, label, tolerance, critical }: QuantityDefinition): CompletionRow {
  const attributes = `${tolerance ? ` tolerance="${toleranceText(tolerance)}"` : ""}${critical ? " critical" : ""}`;
  return { label: id, detail: label, insert: `<Quantity of="${id}"${attributes} />` };
}
