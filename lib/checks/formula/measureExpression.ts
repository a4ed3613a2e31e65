import { ExpressionFault, type Expression, type FunctionName } from "./expression";
import { areSame, combine, describe, isNothing, NUMBER, plain, type Measure } from "./measures";

/**
 * What a formula works out to, from what its names measure.
 * @throws ExpressionFault where two measures do not go together
 */
export function measureExpression(tree: Expression, names: ReadonlyMap<string, Measure>): Measure {
  switch (tree.is) {
    case "number":
      return NUMBER;
    case "name":
      if (tree.name === "c") return plain({ m: 1, s: -1 });
      return names.get(tree.name) ?? NUMBER;
    case "minus": {
      const of = measureExpression(tree.of, names);
      return of.sort === "level" ? { ...of, of: combine({}, of.of, -1) } : of;
    }
    case "call":
      return called(
        tree,
        tree.given.map((one) => measureExpression(one, names)),
      );
    case "^":
      return power(tree, measureExpression(tree.left, names), measureExpression(tree.right, names));
    default: {
      const left = measureExpression(tree.left, names);
      const right = measureExpression(tree.right, names);
      if (tree.is === "*") return product(tree, left, right);
      return tree.is === "/" ? quotient(tree, left, right) : sum(tree, left, right);
    }
  }
}

type Two = Extract<Expression, { left: Expression }>;
type Call = Extract<Expression, { is: "call" }>;
type Level = Extract<Measure, { sort: "level" }>;

const TO_DECIBELS = "10 * log10(x) makes dB of a plain number x, 10^(x/10) a plain number of x dB.";

/** A logarithm of a plain number where a plain number is wanted. */
const asPlain = (measure: Measure): Measure => (measure.sort === "level" && measure.free ? NUMBER : measure);
const isNumber = (measure: Measure): boolean => measure.sort === "plain" && isNothing(measure.powers);

function sum(tree: Two, left: Measure, right: Measure): Measure {
  const sign = tree.is === "+" ? 1 : -1;
  if (left.sort === "level" && right.sort === "level" && areSame(left.per, right.per)) {
    return { ...left, of: combine(left.of, right.of, sign), free: left.free && right.free };
  }
  const [one, other] = [asPlain(left), asPlain(right)];
  if (one.sort === "plain" && other.sort === "plain" && areSame(one.powers, other.powers)) return one;
  const verb = tree.is === "+" ? "added to" : "taken from";
  const help = left.sort !== right.sort ? ` ${TO_DECIBELS}` : " Both sides of a sum measure the same.";
  throw new ExpressionFault(`${capital(describe(right))} cannot be ${verb} ${describe(left)}.${help}`, tree.at);
}

function product(tree: Two, left: Measure, right: Measure): Measure {
  if (left.sort === "plain" && right.sort === "plain") return plain(combine(left.powers, right.powers));
  if (left.sort === "level" && right.sort === "plain") return scaled(tree, left, right, constantOf(tree.right));
  if (left.sort === "plain" && right.sort === "level") return scaled(tree, right, left, constantOf(tree.left));
  const [one, other] = [asPlain(left), asPlain(right)];
  if (one.sort === "level" && other.sort === "level") throw new ExpressionFault(NO_PRODUCT, tree.at);
  return product(tree, one, other);
}

const NO_PRODUCT = "Two levels in dB are not multiplied. Add them, or make plain numbers of them with 10^(x/10).";

function quotient(tree: Two, left: Measure, right: Measure): Measure {
  if (left.sort === "plain" && right.sort === "plain") return plain(combine(left.powers, right.powers, -1));
  if (left.sort === "level" && right.sort === "plain") {
    const divisor = constantOf(tree.right);
    const inverse = plain(combine({}, right.powers, -1));
    return scaled(tree, left, inverse, divisor === null || divisor === 0 ? null : 1 / divisor);
  }
  if (left.sort === "level" && right.sort === "level" && isNothing(left.of) && isNothing(right.of)) {
    return plain(combine(left.per, right.per, -1));
  }
  const divisor = asPlain(right);
  if (divisor.sort === "plain") return quotient(tree, left, divisor);
  throw new ExpressionFault(`Nothing is divided by ${describe(right)}. ${TO_DECIBELS}`, tree.at);
}

/** A level of a quantity times a number is the level of its power, which has to be known when the formula is written. */
function scaled(tree: Two, { of, per, free }: Level, factor: Measure, constant: number | null): Measure {
  if (factor.sort !== "plain") throw new ExpressionFault(NO_PRODUCT, tree.at);
  const counted = combine(per, factor.powers);
  if (isNothing(of)) return { sort: "level", of, per: counted, free: free && isNothing(counted) };
  if (constant === null) {
    const what = describe({ sort: "level", of, per, free });
    throw new ExpressionFault(`${capital(what)} is multiplied or divided by a written number only.`, tree.at);
  }
  return { sort: "level", of: combine({}, of, constant), per: counted, free: false };
}

function power(tree: Two, base: Measure, exponent: Measure): Measure {
  const isTen = constantOf(tree.left) === 10;
  if (isTen && exponent.sort === "level" && !exponent.free && isNothing(exponent.per)) {
    return plain(combine({}, exponent.of, 10));
  }
  const [of, by] = [asPlain(base), asPlain(exponent)];
  if (of.sort === "level")
    throw new ExpressionFault(`${capital(describe(base))} has no power. ${TO_DECIBELS}`, tree.at);
  if (!isNumber(by)) {
    const help = by.sort === "level" ? TO_DECIBELS : "Divide it by something that measures the same.";
    throw new ExpressionFault(`The exponent is a plain number, not ${describe(exponent)}. ${help}`, tree.right.at);
  }
  if (isNothing(of.powers)) return NUMBER;
  const whole = constantOf(tree.right);
  if (whole !== null && Number.isInteger(whole) && Math.abs(whole) <= 12) return plain(combine({}, of.powers, whole));
  throw new ExpressionFault(
    `The power of ${describe(of)} is a written whole number up to 12, such as 2 or -1. Write sqrt(...) for a root.`,
    tree.right.at,
  );
}

function called(tree: Call, given: readonly Measure[]): Measure {
  const one = asPlain(given[0]);
  switch (tree.name) {
    case "sqrt":
      if (one.sort === "level") throw wrongValue(tree, given[0], TO_DECIBELS);
      return plain(combine({}, one.powers, 0.5));
    case "abs":
      if (given[0].sort === "level" && !isNothing(given[0].of)) throw wrongValue(tree, given[0], TO_DECIBELS);
      return given[0];
    case "min":
    case "max":
      return given.reduce((first, second) => same(tree, first, second));
    case "log10":
      if (one.sort === "level") throw wrongValue(tree, given[0], "It is a logarithm already.");
      return { sort: "level", of: combine({}, one.powers, 0.1), per: {}, free: isNothing(one.powers) };
    case "exp":
      if (!isNumber(one)) throw wrongValue(tree, given[0], "It takes a plain number.");
      return NUMBER;
    case "sin":
    case "cos":
      if (one.sort === "plain" && (isNumber(one) || areSame(one.powers, { rad: 1 }))) return NUMBER;
      throw wrongValue(tree, given[0], "It takes an angle, or a plain number as rad.");
    case "atan2":
      if (same(tree, one, asPlain(given[1])).sort === "level") throw wrongValue(tree, given[0], TO_DECIBELS);
      return plain({ rad: 1 });
  }
}

function same(tree: Call, first: Measure, second: Measure): Measure {
  if (
    first.sort === "level" &&
    second.sort === "level" &&
    areSame(first.of, second.of) &&
    areSame(first.per, second.per)
  ) {
    return { ...first, free: first.free && second.free };
  }
  const [one, other] = [asPlain(first), asPlain(second)];
  if (one.sort === "plain" && other.sort === "plain" && areSame(one.powers, other.powers)) return one;
  const what = `${describe(first)} and ${describe(second)}`;
  throw new ExpressionFault(`The values of ${tree.name} measure the same; here are ${what}.`, tree.at);
}

const wrongValue = (tree: { at: number; name: FunctionName }, measure: Measure, help: string) =>
  new ExpressionFault(`${tree.name} does not take ${describe(measure)}. ${help}`, tree.at);

/** A number written out, with its sign or as a fraction; null for anything that a case may change. */
function constantOf(tree: Expression): number | null {
  if (tree.is === "number") return tree.value;
  if (tree.is === "minus") {
    const of = constantOf(tree.of);
    return of === null ? null : -of;
  }
  if (tree.is !== "/" && tree.is !== "*") return null;
  const [left, right] = [constantOf(tree.left), constantOf(tree.right)];
  if (left === null || right === null || (tree.is === "/" && right === 0)) return null;
  return tree.is === "/" ? left / right : left * right;
}

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
