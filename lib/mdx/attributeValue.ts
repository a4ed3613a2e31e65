import { formatNumber, formatUnit } from "@/lib/checks/formatQuantity";
import { inputText } from "@/lib/calculators/inputText";
import { readInput } from "@/lib/calculators/readInput";
import { parseQuantity } from "@/lib/checks/parseQuantity";
import { unitNamed } from "@/lib/checks/unitNamed";
import { UNITS, type Unit } from "@/lib/gnss/units";
import type { Literal } from "@/lib/mdx/literal";
import { CAUTION_TOPICS, type AttributeSpec } from "@/lib/mdx/tags";

/** Value of an attribute in the form the product uses, numbers in the unit of the attribute; or what is wrong with it. */
export type AttributeValue = { value: string | number | boolean } | { problem: string };

export type NumberBounds = { unit: Unit; from: number; to: number; whole?: boolean };

/** @param written true for an attribute without a value */
export function attributeValue(spec: AttributeSpec, written: Literal): AttributeValue {
  switch (spec.input) {
    case "number":
      return numberValue(spec.name, spec, written);
    case "flag":
      return typeof written === "boolean" ? { value: written } : { problem: `${spec.name} is {true} or {false}.` };
    case "name":
      if (typeof written === "string" && NAME.test(written)) return { value: written };
      return { problem: `${spec.name} is letters, figures and hyphens in quotes, such as ${spec.sample}.` };
    case "symbol":
      if (typeof written === "string" && SYMBOL.test(written)) return { value: written };
      return { problem: `${spec.name} is a letter with letters, figures or _ after it, such as ${spec.sample}.` };
    case "unit": {
      const unit = typeof written === "number" ? String(written) : written;
      const found = unit === "1" ? unit : typeof unit === "string" ? unitNamed(unit.trim()) : undefined;
      return found ? { value: found } : { problem: `${spec.name} is one of ${Object.keys(UNITS).join(", ")}.` };
    }
    case "quantity":
      if (typeof written === "number" || (typeof written === "string" && written.trim() !== ""))
        return { value: written };
      return { problem: `${spec.name} is a number, such as ${spec.sample}.` };
    case "topics":
      return topics(spec, written);
    case "described": {
      const read = typeof written === "string" ? readInput(spec.of, written) : { problem: "" };
      if ("value" in read) return { value: inputText(spec.of, read.value) };
      return {
        problem: `${spec.name} cannot be read. ${read.problem || `It is a text in quotes, such as ${spec.sample}.`}`,
      };
    }
    case "text":
      if (typeof written === "number") return { value: String(written) };
      if (typeof written === "string" && written.trim() !== "") return { value: written.trim() };
      return { problem: `${spec.name} is a text in quotes, such as ${spec.sample}.` };
  }
}

const NAME = /^(?=.{1,40}$)[a-z][a-zA-Z0-9]*(-[a-zA-Z0-9]+)*$/;

const SYMBOL = /^[A-Za-z][A-Za-z0-9_]{0,23}$/;

/** A bare number in the unit of the attribute, or a text with a unit of its own. */
export function numberValue(
  name: string,
  bounds: NumberBounds,
  written: Literal,
): { value: number } | { problem: string } {
  const read = typeof written === "string" ? parseQuantity(written, bounds.unit) : { value: written };
  if ("problem" in read) return { problem: `${name} cannot be read. ${read.problem}` };
  const { value } = read;
  if (typeof value !== "number") return { problem: `${name} is a number ${rangeText(bounds)}.` };
  const within = value >= bounds.from && value <= bounds.to && (!bounds.whole || Number.isInteger(value));
  return within
    ? { value }
    : { problem: `${name} must be a ${bounds.whole ? "whole " : ""}number ${rangeText(bounds)}.` };
}

function rangeText({ unit, from, to }: NumberBounds): string {
  const name = formatUnit(unit);
  return `from ${plain(from)} to ${plain(to)}${name === "" ? "" : ` ${name}`}`;
}

/** Shortest decimal text of a bound, with a true minus and thin spaces; tiny ones keep their power of ten. */
function plain(value: number): string {
  if (value !== 0 && Math.abs(value) < 1e-4) return String(value).replace("-", "\u2212");
  return formatNumber(value, String(value).split(".")[1]?.length ?? 0);
}

function topics(spec: AttributeSpec, written: Literal): AttributeValue {
  const words = typeof written === "string" ? written.trim().split(/[\s,]+/) : Array.isArray(written) ? written : [];
  const known: readonly unknown[] = CAUTION_TOPICS;
  const unknown = words.find((word) => !known.includes(word));
  if (words.length > 0 && unknown === undefined)
    return { value: CAUTION_TOPICS.filter((topic) => words.includes(topic)).join(" ") };
  const what = unknown === undefined || unknown === "" ? "" : ` ${JSON.stringify(unknown)} is none of them.`;
  return { problem: `${spec.name} is one or more of ${CAUTION_TOPICS.join(", ")}.${what}` };
}
