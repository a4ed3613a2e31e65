import {
  isCollection,
  isMap,
  isPair,
  isScalar,
  LineCounter,
  parseDocument,
  visit,
  type Document,
  type Node,
} from "yaml";
import type { z } from "zod";
import { FRONT_MATTER_EXAMPLES, frontMatterSchema, type FrontMatter } from "@/lib/mdx/frontMatter";
import { LIMITS } from "@/lib/mdx/limits";
import { problemAt, type Place, type Problem } from "@/lib/mdx/problem";

export type FrontMatterReading = {
  frontMatter: FrontMatter | null;
  problems: Problem[];
  /** Where `require` names each check, for the comparison with the checks of the text. */
  required: { id: string; place: Place }[];
};

/** @param firstLine line of the source on which the text between the two rows of hyphens begins */
export function readFrontMatter(yaml: string, firstLine: number): FrontMatterReading {
  const lines = new LineCounter();
  const place = (offset: number): Place => {
    const { line, col } = lines.linePos(offset);
    return { line: line + firstLine - 1, column: col };
  };
  const refused = (problems: Problem[]): FrontMatterReading => ({ frontMatter: null, problems, required: [] });
  if (yaml.length > LIMITS.frontMatterCharacters) {
    const message = `The front matter is longer than ${LIMITS.frontMatterCharacters} characters. Move text below it.`;
    return refused([problemAt({ line: firstLine, column: 1 }, "size", message)]);
  }
  const document = parseDocument(yaml, { lineCounter: lines, prettyErrors: false, schema: "core" });
  const problems = [
    ...document.errors.map((error) => problemAt(place(error.pos[0]), "front-matter", `${sentence(error.message)}`)),
    ...indirections(document, place),
  ];
  if (problems.length > 0) return refused(problems);

  const value: unknown = document.toJS({ maxAliasCount: 0 });
  const parsed = frontMatterSchema.safeParse(value ?? {});
  if (!parsed.success) {
    return refused(parsed.error.issues.flatMap((issue) => fromIssue(issue, document, place, firstLine)));
  }
  const required = [...namedIds(document, ["require", "all"]), ...namedIds(document, ["require", "some", "of"])].map(
    ({ id, offset }) => ({ id, place: place(offset) }),
  );
  return { frontMatter: parsed.data, problems: requireFaults(parsed.data, required, document, place), required };
}

const sentence = (text: string) => `The front matter cannot be read: ${text.replace(/\.?$/, ".")}`;

/** Anchors, aliases and tags let a short text stand for a huge or a typed one; the front matter needs none of them. */
function indirections(document: Document, place: (offset: number) => Place): Problem[] {
  const problems: Problem[] = [];
  const refuse = (node: Node, what: string) =>
    problems.push(
      problemAt(place(node.range?.[0] ?? 0), "front-matter", `${what} are not read here. Write the value itself.`),
    );
  visit(document, {
    Alias: (_key, node) => void refuse(node, "Aliases (*name)"),
    Node: (_key, node) => {
      if ("anchor" in node && node.anchor) refuse(node, "Anchors (&name)");
      if (node.tag) refuse(node, "Types (!name)");
    },
  });
  return problems;
}

type Issue = z.core.$ZodIssue;

function fromIssue(issue: Issue, document: Document, place: (offset: number) => Place, firstLine: number): Problem[] {
  const path = issue.path.map(String);
  if (issue.code === "unrecognized_keys") {
    const known = Object.keys(FRONT_MATTER_EXAMPLES)
      .filter((name) => name.split(".").length === path.length + 1 && name.startsWith(path.join(".")))
      .map((name) => name.split(".").at(-1));
    return issue.keys.map((key) => {
      const at = place(offsetOf(document, [...path, key], "key") ?? 0);
      return problemAt(at, "front-matter", `"${key}" is not read here. Known are ${known.join(", ")}.`);
    });
  }
  const name = path.filter((part) => !/^\d+$/.test(part)).join(".");
  const example = FRONT_MATTER_EXAMPLES[name];
  const written = document.getIn(issue.path as (string | number)[]);
  const write = example ? ` Write, for instance, ${example}` : "";
  if (written === undefined) {
    const parent = offsetOf(document, path.slice(0, -1), "key");
    const at = parent === null ? { line: firstLine, column: 1 } : place(parent);
    return [problemAt(at, "front-matter", `"${name}" is missing.${write}`)];
  }
  const quotes =
    typeof written === "number" || typeof written === "boolean" ? ` As text it stands in quotes: "${written}".` : "";
  const wants = issue.code === "invalid_type" && issue.expected === "string" ? quotes : "";
  return [
    problemAt(
      place(offsetOf(document, path, "value") ?? 0),
      "front-matter",
      `"${name}" must ${issue.message}.${write || wants}`,
    ),
  ];
}

/** Offset of the key or the value at a path; null where nothing is written. */
function offsetOf(document: Document, path: readonly string[], which: "key" | "value"): number | null {
  let node: unknown = document.contents;
  let offset: number | null = null;
  for (const part of path) {
    if (isMap(node)) {
      const pair = node.items.find((item) => isPair(item) && isScalar(item.key) && String(item.key.value) === part);
      if (!pair) return null;
      offset = (pair.key as Node).range?.[0] ?? offset;
      node = pair.value;
    } else if (isCollection(node)) {
      node = node.items[Number(part)];
    } else return null;
  }
  const value = node as Node | null | undefined;
  return which === "value" ? (value?.range?.[0] ?? offset) : offset;
}

function namedIds(document: Document, path: readonly string[]): { id: string; offset: number }[] {
  const list = document.getIn(path);
  if (!isCollection(list)) return [];
  return list.items.flatMap((item) =>
    isScalar(item) ? [{ id: String(item.value), offset: item.range?.[0] ?? 0 }] : [],
  );
}

/** Faults of `require` that need no knowledge of the checks in the text. */
function requireFaults(
  { require }: FrontMatter,
  required: readonly { id: string; place: Place }[],
  document: Document,
  place: (offset: number) => Place,
): Problem[] {
  const problems: Problem[] = [];
  const seen = new Set<string>();
  for (const { id, place: at } of required) {
    if (seen.has(id)) problems.push(problemAt(at, "require", `"${id}" is required twice. Name each check once.`));
    seen.add(id);
  }
  if (required.length === 0) {
    const at = place(offsetOf(document, ["require"], "key") ?? 0);
    problems.push(
      problemAt(at, "require", `No check is required. Write, for instance, ${FRONT_MATTER_EXAMPLES.require}`),
    );
  }
  if (require.some && require.some.count > require.some.of.length) {
    const at = place(offsetOf(document, ["require", "some", "count"], "value") ?? 0);
    const message = `${require.some.count} of ${require.some.of.length} checks cannot be met. Lower count or name more checks.`;
    problems.push(problemAt(at, "require", message));
  }
  return problems;
}
