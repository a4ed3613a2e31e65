import { SPEED_OF_LIGHT_M_S } from "@/lib/gnss/constants";
import { atan2, cos, exp, log, log10, PI, pow10, sin } from "@/lib/numeric/elementary";
import type { Expression, FunctionName } from "./expression";

/**
 * The value of a formula, from the tree alone.
 * @param values by name, in base units
 * @returns NaN or an infinity where the formula has no value, never a fault
 */
export function evaluateExpression(tree: Expression, values: ReadonlyMap<string, number>): number {
  switch (tree.is) {
    case "number":
      return tree.value;
    case "name":
      if (tree.name === "c") return SPEED_OF_LIGHT_M_S;
      return tree.name === "pi" ? PI : (values.get(tree.name) ?? NaN);
    case "minus":
      return -evaluateExpression(tree.of, values);
    case "call":
      return call(
        tree.name,
        tree.given.map((one) => evaluateExpression(one, values)),
      );
    default: {
      const left = evaluateExpression(tree.left, values);
      const right = evaluateExpression(tree.right, values);
      if (tree.is === "+") return left + right;
      if (tree.is === "-") return left - right;
      if (tree.is === "*") return left * right;
      return tree.is === "/" ? left / right : power(left, right);
    }
  }
}

function call(name: FunctionName, given: readonly number[]): number {
  const [first, second] = given;
  switch (name) {
    case "sqrt":
      return Math.sqrt(first);
    case "abs":
      return Math.abs(first);
    case "min":
      return Math.min(...given);
    case "max":
      return Math.max(...given);
    case "log10":
      return log10(first);
    case "exp":
      return exp(first);
    case "sin":
      return isAngle(first) ? sin(first) : NaN;
    case "cos":
      return isAngle(first) ? cos(first) : NaN;
    case "atan2":
      return atan2(first, second);
  }
}

/** Beyond a million rad our sine and cosine have no figures left and refuse. */
const isAngle = (rad: number) => Math.abs(rad) <= 1e6;

/** Whole exponents by multiplication, so that 2^10 is exact; others of a positive base by logarithm. */
function power(base: number, exponent: number): number {
  if (base === 10) return pow10(exponent);
  if (Number.isInteger(exponent) && Math.abs(exponent) <= 1000) return wholePower(base, exponent);
  if (base > 0) return exp(exponent * log(base));
  return base === 0 && exponent > 0 ? 0 : NaN;
}

function wholePower(base: number, exponent: number): number {
  let result = 1;
  let square = base;
  for (let rest = Math.abs(exponent); rest > 0; rest = Math.floor(rest / 2)) {
    if (rest % 2 === 1) result *= square;
    square *= square;
  }
  return exponent < 0 ? 1 / result : result;
}
