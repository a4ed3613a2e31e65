"use client";
import { markdown } from "@codemirror/lang-markdown";
import { styleTags, tags } from "@lezer/highlight";

const FENCE = "---";
const BRACE = 123; // {

/** Markdown with the two things a module has besides: front matter between lines of hyphens, and comments in braces. */
export const moduleLanguage = markdown({
  extensions: {
    defineNodes: [{ name: "FrontMatter", block: true }, "ModuleComment"],
    props: [styleTags({ FrontMatter: tags.meta, ModuleComment: tags.comment })],
    parseBlock: [
      {
        name: "FrontMatter",
        before: "HorizontalRule",
        parse(context, line) {
          if (context.lineStart > 0 || line.text !== FENCE) return false;
          while (context.nextLine() && line.text !== FENCE);
          const end = context.lineStart + line.text.length;
          context.nextLine();
          context.addElement(context.elt("FrontMatter", 0, end));
          return true;
        },
      },
    ],
    parseInline: [
      {
        name: "ModuleComment",
        parse(context, next, position) {
          if (next !== BRACE || context.slice(position, position + 3) !== "{/*") return -1;
          const close = context.slice(position, context.end).indexOf("*/}");
          if (close < 0) return -1;
          return context.addElement(context.elt("ModuleComment", position, position + close + 3));
        },
      },
    ],
  },
});
