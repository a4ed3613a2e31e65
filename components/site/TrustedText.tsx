import { readFile } from "node:fs/promises";
import path from "node:path";
import type { ComponentProps } from "react";
import { compileMDX } from "next-mdx-remote/rsc";
import { notFound } from "next/navigation";
import remarkGfm from "remark-gfm";

type Text = { content: React.ReactNode; frontmatter: { title?: string; description?: string } };

// What may scroll sideways on a phone can be scrolled by keys as well.
const components = {
  pre: (props: ComponentProps<"pre">) => <pre tabIndex={0} {...props} />,
  table: (props: ComponentProps<"table">) => <table tabIndex={0} {...props} />,
};

/** A text of our own from content/; a file that is not there is a page that is not there. */
export async function trustedText(name: string): Promise<Text> {
  const file = path.join(process.cwd(), "content", `${name}.mdx`);
  const source = await readFile(file, "utf8").catch((error: NodeJS.ErrnoException) => {
    if (error.code === "ENOENT") notFound();
    throw error;
  });
  return compileMDX<Text["frontmatter"]>({
    source,
    components,
    options: { parseFrontmatter: true, mdxOptions: { remarkPlugins: [remarkGfm] } },
  });
}

/** The text on a sheet, as a page. */
export async function TrustedText({ name }: { name: string }) {
  const { content } = await trustedText(name);
  return (
    <div className="bg-sheet">
      <article className="page prose-page py-10 desk:py-14">
        <div className="prose">{content}</div>
      </article>
    </div>
  );
}
