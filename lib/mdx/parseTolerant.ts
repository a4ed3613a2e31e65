import type { Root } from "mdast";
import remarkFrontmatter from "remark-frontmatter";
import remarkGfm from "remark-gfm";
import remarkMath from "remark-math";
import remarkMdx from "remark-mdx";
import remarkParse from "remark-parse";
import { unified } from "unified";
import { braces } from "@/lib/mdx/braces";
import type { Problem } from "@/lib/mdx/problem";
import { SourceText } from "@/lib/mdx/sourceText";
import { isParserStop, syntaxFault } from "@/lib/mdx/syntaxFault";

const parser = unified()
  .use(remarkParse)
  .use(remarkFrontmatter)
  .use(remarkMdx, { acorn: braces })
  .use(remarkGfm)
  .use(remarkMath)
  .freeze();

/**
 * The syntax tree and what stopped the parser on the way. It gives up at its first fault, so the fault is reported, blanked
 * out and the rest tried again, that a lead sees more than one at a time.
 * @returns tree null when it never got through; a tree beside faults is good for finding more faults and nothing else
 */
export function parseTolerant(text: string): { tree: Root | null; faults: Problem[] } {
  const faults: Problem[] = [];
  let remaining = text;
  for (let tries = 0; tries < MOST_TRIES; tries++) {
    const source = new SourceText(remaining);
    try {
      return { tree: parser.parse(remaining), faults };
    } catch (error) {
      if (!isParserStop(error)) throw error;
      const { problem, hide } = syntaxFault(error, source);
      faults.push(problem);
      const blanked =
        remaining.slice(0, hide.from) +
        remaining.slice(hide.from, hide.to).replace(/[^\r\n]/g, " ") +
        remaining.slice(hide.to);
      if (blanked === remaining) break;
      remaining = blanked;
    }
  }
  return { tree: null, faults };
}

/** Each try reads the whole source; the time limit of the thread stands over all of them. */
const MOST_TRIES = 12;
