import type { Nodes, Paragraph, Root, RootContent } from "mdast";
import type { BlockTag } from "@/lib/mdx/nodes";

/**
 * `<Caution about="height">Text</Caution>` on one line is a paragraph with a tag in it to the parser and a tag of its own to
 * the person who wrote it. Paragraphs of tags alone become these tags.
 */
export function liftTags(tree: Root): void {
  lift(tree);
}

function lift(node: Nodes): void {
  if (!("children" in node)) return;
  for (const child of node.children) lift(child);
  if (!node.children.some(isTagsAlone)) return;
  // A paragraph stands only where blocks stand, so blocks may stand in its place.
  const parent = node as { children: RootContent[] };
  parent.children = parent.children.flatMap((child) => (isTagsAlone(child) ? tagsOf(child) : [child]));
}

const isTagsAlone = (node: Nodes): node is Paragraph =>
  node.type === "paragraph" &&
  node.children.some((child) => child.type === "mdxJsxTextElement") &&
  node.children.every(
    (child) => child.type === "mdxJsxTextElement" || (child.type === "text" && child.value.trim() === ""),
  );

function tagsOf(paragraph: Paragraph): RootContent[] {
  return paragraph.children.flatMap((child): BlockTag[] => {
    if (child.type !== "mdxJsxTextElement") return [];
    const { name, attributes, children, position } = child;
    const inside = children.length > 0 ? [{ type: "paragraph" as const, children, position }] : [];
    return [{ type: "mdxJsxFlowElement", name, attributes, children: inside, position }];
  });
}
