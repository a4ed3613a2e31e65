import type { Nodes, Root } from "mdast";
import { addressFault } from "@/lib/mdx/address";
import { guardTag } from "@/lib/mdx/guardTag";
import { LIMITS } from "@/lib/mdx/limits";
import type { TreeProperty } from "@/lib/mdx/moduleTree";
import type { Addressed, Braces, Formula, Picture, Tag } from "@/lib/mdx/nodes";
import { problemAt, type Problem, type Range, type Repair } from "@/lib/mdx/problem";
import { rangeOf } from "@/lib/mdx/readAttributes";
import type { SourceText } from "@/lib/mdx/sourceText";
import type { WrittenCheck } from "@/lib/mdx/writtenTag";

export type Guarded = {
  problems: Problem[];
  checks: WrittenCheck[];
  /** Tags that reach the tree and what they carry there. A tag that is not in this map is left out. */
  kept: Map<Tag, Record<string, TreeProperty>>;
};

export type GuardContext = Guarded & { source: SourceText; formulaCharacters: number };

/** Looks at every node of a parsed module and collects all that the language does not have. Refused addresses are emptied. */
export function guard(tree: Root, source: SourceText): Guarded {
  const context: GuardContext = { problems: [], checks: [], kept: new Map(), source, formulaCharacters: 0 };
  for (const child of tree.children) inspect(child, [], context);
  return { problems: context.problems, checks: context.checks, kept: context.kept };
}

function inspect(node: Nodes, ancestors: readonly Nodes[], context: GuardContext): void {
  const range = rangeOf(node) ?? { from: { line: 1, column: 1 }, to: { line: 1, column: 1 } };
  const refuse = (rule: string, message: string, repair?: Repair) =>
    context.problems.push(problemAt(range, rule, message, repair));
  if (CONTAINERS.has(node.type) && ancestors.filter((one) => CONTAINERS.has(one.type)).length >= LIMITS.nesting) {
    refuse("nesting", `Lists, quotations and tags are nested more than ${LIMITS.nesting} deep. Start anew outside.`);
    return;
  }
  switch (node.type) {
    case "mdxjsEsm":
      refuse(
        "import-export",
        "A line that begins with import or export is program text, and nothing in a module runs. Begin the sentence with another word, or use the tags as they are: they need no import.",
      );
      return;
    case "mdxFlowExpression":
    case "mdxTextExpression":
      inspectExpression(node, range, context);
      return;
    case "html":
      refuse("html", "HTML is not read. Write Markdown or a tag of the module language.");
      return;
    case "math":
    case "inlineMath":
      inspectFormula(node, context, refuse);
      return;
    case "code":
      if (node.lang === "math") inspectFormula(node, context, refuse);
      return;
    case "image":
    case "imageReference":
      inspectImage(node, refuse);
      return;
    case "link":
    case "definition":
      inspectAddress(node, range, context);
      break;
    case "mdxJsxFlowElement":
    case "mdxJsxTextElement":
      guardTag(node, range, ancestors, context);
      break;
    default:
  }
  if ("children" in node) for (const child of node.children) inspect(child, [...ancestors, node], context);
}

const CONTAINERS = new Set(["blockquote", "listItem", "footnoteDefinition", "mdxJsxFlowElement", "mdxJsxTextElement"]);

function inspectExpression(node: Braces, range: Range, context: GuardContext): void {
  if (isComment(node.value)) return;
  const text = node.value.trim();
  const quoted = /^(["'])([^"'\\\n]*)\1$/.exec(text)?.[2];
  const value = quoted ?? (/^-?\d+(\.\d+)?$/.test(text) ? text : null);
  const written =
    value ?? (context.source.slice(range).startsWith("{") && !text.includes("\n") ? `\\{${node.value}\\}` : null);
  const repair = written === null ? undefined : { label: `Write ${written}`, text: written, ...range };
  const message =
    "Braces in the text are program text, and nothing in a module runs. Write the value itself, \\{ for a brace that is to be seen, or {/* ... */} for a comment.";
  context.problems.push(problemAt(range, "expression", message, repair));
}

/** Comments and white space and nothing else; a pattern would need exponential time for a hostile row of comments. */
function isComment(value: string): boolean {
  let rest = value.trim();
  if (rest === "") return false;
  while (rest.startsWith("/*")) {
    const end = rest.indexOf("*/", 2);
    if (end < 0) return false;
    rest = rest.slice(end + 2).trimStart();
  }
  return rest === "";
}

function inspectImage(node: Picture, refuse: (rule: string, message: string) => void): void {
  const name = node.alt ? ` (“${node.alt.slice(0, 40)}”)` : "";
  refuse("picture", `Pictures${name} are not available in this release. Say it in words, a table or a formula.`);
}

function inspectAddress(node: Addressed, range: Range, context: GuardContext): void {
  const long = node.url.length > LIMITS.addressCharacters;
  const fault = long
    ? { message: `An address has at most ${LIMITS.addressCharacters} characters.`, better: null }
    : addressFault(node.url);
  if (!fault) return;
  const text = fault.better && addressRepair(context.source.slice(range), node.url, fault.better);
  const repair = text ? { label: `Write ${fault.better}`, text, ...range } : undefined;
  context.problems.push(problemAt(range, "address", fault.message, repair));
  node.url = "";
}

function addressRepair(written: string, address: string, better: string): string | null {
  if (written.includes(address)) return written.replace(address, () => better);
  // "www.example.org" alone in the text becomes a link by itself.
  return address === `http://${written}` ? `[${written}](${better})` : null;
}

function inspectFormula(node: Formula, context: GuardContext, refuse: (rule: string, message: string) => void): void {
  // The formula setter passes these over without a word, so the lead is told here.
  const command = /\\(href|url|includegraphics|html(?:Class|Id|Style|Data))(?![a-zA-Z])/.exec(node.value)?.[0];
  if (command)
    refuse("formula", `${command} is not set in formulas. Write links outside them: [text](https://address).`);
  context.formulaCharacters += node.value.length;
  const { formulaCharacters: one, formulaCharactersInAll: all } = LIMITS;
  if (node.value.length <= one && context.formulaCharacters <= all) return;
  refuse(
    "formula",
    `A formula has at most ${one} characters, and all of them together ${all}. Write less of it as formula.`,
  );
  // Setting it would take the time that the bound is there to save.
  node.value = "";
  node.data = { hName: "span", hChildren: [] };
}
