/** Bounds of the module language. The first four are part of the language; the rest keep one reading short. */
export const LIMITS = {
  bytes: 64 * 1024,
  lines: 2000,
  nesting: 8,
  literal: { depth: 4, nodes: 200 },
  attributeCharacters: 2000,
  addressCharacters: 500,
  formulaCharacters: 2000,
  formulaCharactersInAll: 16_000,
  frontMatterCharacters: 8000,
  /** List and quotation markers after the first of a line, in the whole module: 2,000 lines of eight took a minute. */
  furtherMarkers: 300,
  checks: 12,
  /** Characters of the tree as JSON: reference links and formulas make more of it than was written. */
  treeCharacters: 4_000_000,
  /** Longest reading before its thread is ended; a lawful module of full size takes about a second. */
  readingMs: 10_000,
  /** A thread that is not ready by then will not be. */
  threadStartMs: 60_000,
  waitingReadings: 40,
} as const;

/**
 * Marks allowed within one block (a block ends at an empty line). Looking for the partner of each of these takes the parser
 * quadratic time within a block, so that 20,000 pairs of * and _ kept it busy for minutes.
 */
export const MARKS_PER_BLOCK: Readonly<Record<string, number>> = {
  "*": 400,
  _: 400,
  "~": 200,
  "[": 300,
  "]": 600,
  "!": 400,
  "`": 400,
  $: 300,
  "<": 300,
  "{": 300,
  "}": 300,
  "|": 1500,
  "&": 800,
  "\\": 1500,
};

/** Marks allowed in the whole module: many full blocks are slow in sum, and each formula and each tag has a cost of its own. */
export const MARKS_PER_MODULE: Readonly<Record<string, number>> = {
  "*": 4000,
  _: 4000,
  "~": 2000,
  "[": 3000,
  "`": 6000,
  $: 800,
  "<": 1500,
  "{": 2000,
  "}": 2000,
  "|": 12_000,
};
