import type { Components } from "hast-util-to-jsx-runtime";
import { classNames } from "@/components/ui/classNames";
import { ScrollRegion } from "@/components/ui/ScrollRegion";

/** How the Markdown of a module looks. The page has the one h1, so that headings of the text begin at h2. */
export const elements: Components = {
  h1: (props) => <h2 {...props} className="mt-8 mb-2 text-h2" />,
  h2: (props) => <h3 {...props} className="mt-6 mb-2 text-h3" />,
  h3: (props) => <h4 {...props} className="mt-5 mb-1 text-body font-semibold" />,
  h4: (props) => <h5 {...props} className="mt-4 mb-1 text-body font-semibold" />,
  h5: (props) => <h6 {...props} className="mt-4 mb-1 text-body font-semibold" />,
  h6: (props) => <h6 {...props} className="mt-4 mb-1 text-body font-semibold" />,
  p: (props) => <p {...props} className="my-3 max-w-measure" />,
  ul: (props) => <ul {...props} className="my-3 max-w-measure list-disc pl-6" />,
  ol: (props) => <ol {...props} className="my-3 max-w-measure list-decimal pl-6" />,
  li: (props) => <li {...props} className="my-1" />,
  blockquote: (props) => <blockquote {...props} className="my-3 border-l-8 border-rule pl-4 text-ink-2" />,
  hr: () => <hr className="my-6 border-t-hair border-rule" />,
  code: (props) => <code {...props} className="text-[0.9em]" />,
  // A scrolling region can be reached with the keys alone.
  pre: (props) => <pre {...props} tabIndex={0} className="my-4 overflow-x-auto bg-well p-3 text-code" />,
  table: (props) => (
    <ScrollRegion label="Table" className="my-4">
      <table {...props} className="table" />
    </ScrollRegion>
  ),
  a: (props) => <a {...props} className="link" rel={isElsewhere(props.href) ? "noopener noreferrer" : undefined} />,
  // Task lists are read here, not ticked.
  input: ({ checked }) => <span className="mr-2 font-semibold">{checked ? "Done:" : "To do:"}</span>,
  span: (props) => {
    const display = props.className?.split(" ").includes("katex-display");
    const scroll = display ? { tabIndex: 0, role: "group", "aria-label": "Formula" } : {};
    return (
      <span {...props} {...scroll} className={classNames(props.className, display && "block overflow-x-auto py-2")} />
    );
  },
};

const isElsewhere = (address: string | undefined) => /^[a-z]+:/i.test(address ?? "");
