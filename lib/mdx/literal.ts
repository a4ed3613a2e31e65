import {
  parseExpressionAt,
  type Expression,
  type Literal as AcornLiteral,
  type Node,
  type ObjectExpression,
} from "acorn";
import { LIMITS } from "@/lib/mdx/limits";

export type Literal = string | number | boolean | null | Literal[] | LiteralRecord;
export interface LiteralRecord {
  [key: string]: Literal;
}

/** `offset` counts from the start of the expression. */
export type LiteralReading = { value: Literal } | { problem: string; offset: number };

/**
 * Value of an attribute in braces, read from the syntax tree: nothing is evaluated, and a record has no prototype.
 * @param expression the text between the braces
 */
export function readLiteral(expression: string): LiteralReading {
  if (expression.length > LIMITS.attributeCharacters) {
    return { problem: `A value has at most ${LIMITS.attributeCharacters} characters.`, offset: 0 };
  }
  try {
    const tree = parseExpressionAt(expression, 0, { ecmaVersion: 2022, sourceType: "module" });
    if (expression.slice(tree.end).trim() !== "") throw new Refused(ONE_VALUE, tree.end);
    return { value: valueOf(tree, { depth: 0, nodes: 0, expression }) };
  } catch (error) {
    if (error instanceof Refused) return { problem: error.message, offset: error.offset };
    if (error instanceof SyntaxError || error instanceof RangeError) {
      const offset = "pos" in error && typeof error.pos === "number" ? error.pos : 0;
      return { problem: ONE_VALUE, offset };
    }
    throw error;
  }
}

const ONE_VALUE =
  "Braces hold one written value: a number, a quoted text, true, false, null, a list or a record of these.";

class Refused extends Error {
  override name = "Refused";
  constructor(
    message: string,
    readonly offset: number,
  ) {
    super(message);
  }
}

type Bounds = { depth: number; nodes: number; expression: string };

function valueOf(node: Expression, bounds: Bounds): Literal {
  if (++bounds.nodes > LIMITS.literal.nodes)
    throw new Refused(`A value has at most ${LIMITS.literal.nodes} parts.`, node.start);
  switch (node.type) {
    case "Literal":
      return plainValue(node, bounds.expression);
    case "UnaryExpression": {
      const { argument, operator } = node;
      if (operator !== "-" || argument.type !== "Literal" || typeof argument.value !== "number") throw refusal(node);
      const value = plainValue(argument, bounds.expression) as number;
      return value === 0 ? 0 : -value;
    }
    case "ArrayExpression":
      return deeper(node, bounds, () =>
        node.elements.map((element) => {
          if (element === null)
            throw new Refused("A list has no empty places. Write null or leave the place out.", node.start);
          if (element.type === "SpreadElement") throw refusal(element);
          return valueOf(element, bounds);
        }),
      );
    case "ObjectExpression":
      return deeper(node, bounds, () => recordOf(node, bounds));
    default:
      throw refusal(node);
  }
}

function deeper<T>(node: Node, bounds: Bounds, read: () => T): T {
  if (++bounds.depth > LIMITS.literal.depth)
    throw new Refused(`A value is nested at most ${LIMITS.literal.depth} deep.`, node.start);
  const value = read();
  bounds.depth--;
  return value;
}

function recordOf(node: ObjectExpression, bounds: Bounds): LiteralRecord {
  const record = Object.create(null) as LiteralRecord;
  for (const property of node.properties) {
    if (property.type !== "Property") throw refusal(property);
    if (property.computed || property.shorthand || property.method || property.kind !== "init") throw refusal(property);
    const { key } = property;
    const name =
      key.type === "Identifier" ? key.name : key.type === "Literal" && typeof key.value === "string" ? key.value : null;
    if (name === null) throw refusal(property);
    if (FORBIDDEN_KEYS.has(name)) throw new Refused(`"${name}" cannot be the name of an entry.`, property.start);
    if (Object.hasOwn(record, name))
      throw new Refused(`"${name}" is written twice in this record. Delete one.`, property.start);
    record[name] = valueOf(property.value, bounds);
  }
  return record;
}

const FORBIDDEN_KEYS = new Set(["__proto__", "constructor", "prototype"]);

/** 0x10, 1_000 and 1n are numbers of a programming language; a lead means a decimal number. */
const DECIMAL = /^(\d+(\.\d*)?|\.\d+)(e[+-]?\d+)?$/i;

function plainValue(node: AcornLiteral, expression: string): Literal {
  const { value } = node;
  if (node.regex || node.bigint) throw refusal(node);
  if (typeof value === "number") {
    if (Number.isFinite(value) && DECIMAL.test(expression.slice(node.start, node.end))) return value;
    throw new Refused("Write a decimal number, such as 12.5 or 1e-3.", node.start);
  }
  if (typeof value === "string" || typeof value === "boolean" || value === null) return value;
  throw refusal(node);
}

function refusal(node: { start: number; type?: string }): Refused {
  if (node.type === "Identifier")
    return new Refused("A name stands here. Write the value itself, or a text in quotes.", node.start);
  return new Refused(`Nothing in braces is worked out. ${ONE_VALUE}`, node.start);
}
