/** What a released module is stored as and rendered from: a syntax tree of HTML elements and our tags, plain JSON. */
export type ModuleTree = { type: "root"; children: TreeNode[] };

export type TreeNode = TreeElement | { type: "text"; value: string };

export type TreeElement = {
  type: "element";
  tagName: string;
  properties: Record<string, TreeProperty>;
  children: TreeNode[];
};

export type TreeProperty = string | number | boolean | (string | number)[];
