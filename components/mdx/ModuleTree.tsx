import "katex/dist/katex.min.css";
import { toJsxRuntime, type Components } from "hast-util-to-jsx-runtime";
import type { ReactNode } from "react";
import { Fragment, jsx, jsxs } from "react/jsx-runtime";
import type { ModuleTree as Tree, TreeElement, TreeNode } from "@/lib/mdx/moduleTree";
import type { CheckCardProps } from "./CheckCard";
import { components } from "./components";
import { elements } from "./elements";

type ModuleTreeProps = {
  tree: Tree;
  /** By check id; `action` is the state of the check and its key. */
  checkCards?: Readonly<Record<string, Omit<CheckCardProps, "children">>>;
};

/** A module as its reader sees it, from the stored tree: nothing is parsed and nothing is evaluated. */
export function ModuleTree({ tree, checkCards = {} }: ModuleTreeProps) {
  return (
    <div className="module-tree">
      {runs(tree.children).map((run, at) => {
        if (!isCheck(run)) return <Fragment key={at}>{render(run)}</Fragment>;
        const id = String(run.properties.id);
        const card = Object.hasOwn(checkCards, id) ? checkCards[id] : undefined;
        return (
          <components.Check key={at} {...card} id={id}>
            {render(run.children)}
          </components.Check>
        );
      })}
    </div>
  );
}

/** Checks stand between the parts of the text; each part is rendered in one piece. */
function runs(children: readonly TreeNode[]): (TreeNode[] | TreeElement)[] {
  const found: (TreeNode[] | TreeElement)[] = [];
  for (const node of children) {
    const last = found.at(-1);
    if (node.type === "element" && node.tagName === "Check") found.push(node);
    else if (Array.isArray(last)) last.push(node);
    else found.push([node]);
  }
  return found;
}

const isCheck = (run: TreeNode[] | TreeElement): run is TreeElement => !Array.isArray(run);

function render(children: TreeNode[]): ReactNode {
  return toJsxRuntime(
    { type: "root", children },
    // Names of tags are not names of HTML elements, which is all that the type of the library knows.
    { Fragment, jsx, jsxs, components: { ...elements, ...components } as Components },
  );
}
