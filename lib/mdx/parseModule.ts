import { guard } from "@/lib/mdx/guard";
import { liftTags } from "@/lib/mdx/liftTags";
import { LIMITS } from "@/lib/mdx/limits";
import { unread, type ParsedModule } from "@/lib/mdx/parsedModule";
import { parseTolerant } from "@/lib/mdx/parseTolerant";
import { precheck } from "@/lib/mdx/precheck";
import { inOrder, LISTED_PROBLEMS, problemAt, type Problem } from "@/lib/mdx/problem";
import { readFrontMatter } from "@/lib/mdx/readFrontMatter";
import { SourceText } from "@/lib/mdx/sourceText";
import { toTree } from "@/lib/mdx/toTree";

/** Can take very long on a hostile text: call it through `parseInThread` only. */
export function parseModule(text: string): ParsedModule {
  const early = precheck(text);
  if (early.length > 0) return unread(early);
  try {
    return parseWithin(text);
  } catch (error) {
    // The parser recurses once for each level of nesting.
    if (!(error instanceof RangeError)) throw error;
    return unread([
      problemAt({ line: 1, column: 1 }, "nesting", "Something in this module is nested too deep to be read."),
    ]);
  }
}

function parseWithin(text: string): ParsedModule {
  const { tree: syntax, faults } = parseTolerant(text);
  if (!syntax) return unread(faults);
  liftTags(syntax);
  const head = syntax.children[0];
  const front =
    head?.type === "yaml"
      ? readFrontMatter(head.value, (head.position?.start.line ?? 1) + 1)
      : { frontMatter: null, problems: [noFrontMatter()], required: [] };
  const { problems, checks, kept } = guard(syntax, new SourceText(text));
  if (faults.length > 0) {
    const certain = problems.filter(({ rule }) => HOLDS_BESIDE_A_FAULT.has(rule));
    return { ...unread([...faults, ...front.problems, ...certain]), frontMatter: front.frontMatter };
  }
  const { tree, problems: formulas } = toTree(syntax, kept);
  const all = [...front.problems, ...problems, ...formulas];
  if (JSON.stringify(tree).length > LIMITS.treeCharacters) {
    const message = "Formulas and links make more of this module than can be kept. Move a part to another module.";
    return unread([...all, problemAt({ line: 1, column: 1 }, "size", message)]);
  }
  return {
    problems: inOrder(all).slice(0, LISTED_PROBLEMS),
    frontMatter: front.frontMatter,
    required: front.required,
    checks,
    tree,
  };
}

/** Blanking out a fault can move a tag out of its check, but it cannot make one of these. */
const HOLDS_BESIDE_A_FAULT = new Set([
  "import-export",
  "spread",
  "fragment",
  "tag",
  "html",
  "not-available",
  "attribute-value",
  "address",
  "picture",
]);

function noFrontMatter(): Problem {
  const at = { line: 1, column: 1 };
  const message =
    "The module has no front matter. Begin its first line with --- and end the front matter with --- on a line of its own.";
  return problemAt(at, "front-matter", message, {
    label: "Write the front matter",
    text: FRONT_MATTER,
    from: at,
    to: at,
  });
}

const FRONT_MATTER = `---
code: NEW-1
title: Title of the module
scope: Work and equipment that the certificate speaks for
limits: Not for safety-of-life use.
edition: written to ISO/IEC 17024:2012
valid: { months: 36, reason: why this long }
supervision: open
aids: [bench]
sitting: { days: 30, freshCases: 1, waitHours: 24 }
require: { all: [] }
---

`;
