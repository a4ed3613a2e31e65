import type { Nodes } from "mdast";
// The parsers add their node types to those of mdast.
import type {} from "mdast-util-mdx";
import type {} from "remark-math";

export type Tag = Extract<Nodes, { type: "mdxJsxFlowElement" | "mdxJsxTextElement" }>;
export type BlockTag = Extract<Nodes, { type: "mdxJsxFlowElement" }>;
export type TagAttribute = Tag["attributes"][number];
export type Braces = Extract<Nodes, { type: "mdxFlowExpression" | "mdxTextExpression" }>;
export type Formula = Extract<Nodes, { type: "math" | "inlineMath" | "code" }>;
export type Picture = Extract<Nodes, { type: "image" | "imageReference" }>;
export type Addressed = Extract<Nodes, { type: "link" | "definition" }>;
