/** What to write instead of an HTML element, for those that a lead may reach for; null for any other name. */
export function htmlAdvice(name: string): string | null {
  const element = name.toLowerCase();
  return Object.hasOwn(ADVICE, element) ? (ADVICE[element] ?? null) : null;
}

const RUNS = "Nothing in a module runs or loads anything. Delete it.";
const TABLE = "Write a table with | between the columns and a row of --- under the heads.";
const LIST = "Write a list with - or 1. at the start of each line.";

const ADVICE: Readonly<Record<string, string>> = {
  a: "Write [text](https://address).",
  b: "Write **text**.",
  strong: "Write **text**.",
  i: "Write *text*.",
  em: "Write *text*.",
  s: "Write ~~text~~.",
  del: "Write ~~text~~.",
  sub: "Write a formula: $C/N_0$.",
  sup: "Write a formula: $10^{-3}$.",
  br: "End the line with a backslash.",
  hr: "Write --- on a line of its own.",
  p: "Leave an empty line between paragraphs.",
  div: "Leave an empty line between paragraphs.",
  span: "Delete the tag; the text inside stays.",
  h1: "Write # before the heading.",
  h2: "Write ## before the heading.",
  h3: "Write ### before the heading.",
  ul: LIST,
  ol: LIST,
  li: LIST,
  table: TABLE,
  tr: TABLE,
  td: TABLE,
  th: TABLE,
  code: "Write `text`.",
  pre: "Put ``` on the line before and the line after.",
  blockquote: "Write > before each line.",
  img: "Pictures are not available in this release.",
  svg: "Pictures are not available in this release.",
  script: RUNS,
  style: RUNS,
  iframe: RUNS,
  object: RUNS,
  embed: RUNS,
  link: RUNS,
  meta: RUNS,
  base: RUNS,
  form: RUNS,
  input: RUNS,
  button: RUNS,
  video: RUNS,
  audio: RUNS,
};
