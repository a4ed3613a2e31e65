/** A formula as a tree; `at` counts characters of its text from 0, for faults. */
export type Expression = { at: number } & (
  | { is: "number"; value: number }
  | { is: "name"; name: string }
  | { is: "minus"; of: Expression }
  | { is: Operation; left: Expression; right: Expression }
  | { is: "call"; name: FunctionName; given: readonly Expression[] }
);

export type Operation = "+" | "-" | "*" | "/" | "^";

/** Functions by name, with the fewest and the most values they take. */
export const FUNCTIONS = {
  sqrt: [1, 1],
  abs: [1, 1],
  min: [2, 8],
  max: [2, 8],
  log10: [1, 1],
  exp: [1, 1],
  sin: [1, 1],
  cos: [1, 1],
  atan2: [2, 2],
} as const satisfies Record<string, readonly [number, number]>;

export type FunctionName = keyof typeof FUNCTIONS;

export const isFunctionName = (name: string): name is FunctionName => Object.hasOwn(FUNCTIONS, name);

/** Speed of light in m/s and the number pi. */
export const CONSTANTS = ["c", "pi"] as const;

export type ConstantName = (typeof CONSTANTS)[number];

export const isConstantName = (name: string): name is ConstantName => (CONSTANTS as readonly string[]).includes(name);

/** Bounds that keep walking a formula short, whoever wrote it. */
export const MOST_NODES = 200;
export const MOST_NESTING = 24;

/** What is wrong with a formula and where; the sentence says what to write instead. */
export class ExpressionFault extends Error {
  override name = "ExpressionFault";
  constructor(
    message: string,
    readonly at: number,
  ) {
    super(message);
  }
}
