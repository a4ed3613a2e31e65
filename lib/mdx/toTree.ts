import type { Element, ElementContent, Root as HtmlRoot } from "hast";
import type { Root } from "mdast";
import rehypeKatex from "rehype-katex";
import remarkRehype, { type Options } from "remark-rehype";
import { unified } from "unified";
import { VFile } from "vfile";
import type { ModuleTree, TreeElement, TreeNode, TreeProperty } from "@/lib/mdx/moduleTree";
import type { Tag } from "@/lib/mdx/nodes";
import { problemAt, type Problem } from "@/lib/mdx/problem";

/** A tree that is plain JSON, from the parts of the syntax tree that the guard let pass; and what is wrong with formulas. */
export function toTree(
  syntax: Root,
  kept: ReadonlyMap<Tag, Record<string, TreeProperty>>,
): { tree: ModuleTree; problems: Problem[] } {
  const tag = (state: State, node: Tag): Element | undefined => {
    const properties = kept.get(node);
    if (!properties) return undefined;
    return { type: "element", tagName: node.name ?? "", properties, children: state.all(node) as ElementContent[] };
  };
  const nothing = () => undefined;
  const handlers = {
    mdxJsxFlowElement: tag,
    mdxJsxTextElement: tag,
    mdxFlowExpression: nothing,
    mdxTextExpression: nothing,
    mdxjsEsm: nothing,
    yaml: nothing,
    image: nothing,
    imageReference: nothing,
    html: nothing,
  };
  const file = new VFile();
  const html = unified()
    .use(remarkRehype, { handlers, footnoteLabel: "Notes" })
    // maxSize in em, maxExpand in macro expansions: a formula can neither cover the page nor grow without end.
    .use(rehypeKatex, { trust: false, strict: "ignore", maxSize: 20, maxExpand: 200 })
    .runSync(syntax, file) as HtmlRoot;
  let heading = 0;
  const nodes = plain(html.children, (element) => {
    if (/^h[1-6]$/.test(element.tagName)) element.properties.id ??= `part-${++heading}`;
  });
  return { tree: { type: "root", children: nodes }, problems: file.messages.map(formulaProblem) };
}

/** Of the handlers that turn Markdown into elements. */
type State = Parameters<NonNullable<NonNullable<Options["handlers"]>["paragraph"]>>[0];

/** Copies elements and text only, with the properties that JSON keeps. */
function plain(
  children: readonly HtmlRoot["children"][number][],
  onElement: (element: TreeElement) => void,
): TreeNode[] {
  return children.flatMap((child): TreeNode[] => {
    if (child.type === "text") return [{ type: "text", value: child.value }];
    if (child.type !== "element") return [];
    const element: TreeElement = {
      type: "element",
      tagName: child.tagName,
      properties: plainProperties(child.properties),
      children: [],
    };
    onElement(element);
    element.children = plain(child.children, onElement);
    return [element];
  });
}

const plainProperties = (properties: Element["properties"]): Record<string, TreeProperty> =>
  Object.fromEntries(
    Object.entries(properties).flatMap(([name, value]) =>
      value === null || value === undefined ? [] : [[name, value]],
    ),
  );

function formulaProblem(message: VFile["messages"][number]): Problem {
  const reason = message.cause instanceof Error ? message.cause.message : message.reason;
  const what = reason
    .replace(/^KaTeX parse error: /, "")
    .replace(/ at position \d+: [\s\S]*$| at end of input: [\s\S]*$/, "");
  const point = message.place && "start" in message.place ? message.place.start : message.place;
  const at = { line: point?.line ?? 1, column: point?.column ?? 1 };
  return problemAt(at, "formula", `The formula cannot be set: ${what}.`);
}
