import { convert, isConvertible, type Unit } from "@/lib/gnss/units";
import { formatUnit } from "./formatQuantity";
import { unitNamed } from "./unitNamed";

export type Reading = { value: number } | { problem: string };

/**
 * Reads a quantity as people type it and gives it in `unit`: "-1.75 kHz", "−1 750", "88,75 chip", "2.3e-8", "1x10^-3".
 * A point or a comma is the decimal mark, spaces part the thousands. What could be read in two ways is asked, never guessed.
 */
export function parseQuantity(text: string, unit: Unit): Reading {
  if (text.length > LONGEST_TEXT) return { problem: "That is too long for a number." };
  const plain = plainText(text);
  if (plain === "") return { problem: "Nothing was handed in." };
  const parts = NUMBER_AND_UNIT.exec(plain);
  if (!parts) return { problem: `“${text.trim()}” is not a number.` };
  const number = readNumber(parts[1]);
  if ("problem" in number) return number;
  const typedUnit = readUnit(parts[2], unit);
  if ("problem" in typedUnit) return typedUnit;
  const value = convert(number.value, typedUnit.unit, unit);
  if (!(Math.abs(value) <= LARGEST)) return { problem: `${parts[1].trim()} is too large to be a quantity here.` };
  return { value: value === 0 ? 0 : value }; // no minus zero
}

const LONGEST_TEXT = 60;
const LARGEST = 1e15; // beyond it not every whole number can be kept

const NUMBER_AND_UNIT = /^([+-]? ?[0-9.,]+(?: [0-9.,]+)*(?:e[+-]?[0-9]+)?) ?([^0-9.,].*)?$/i;
const PLAIN = /^[+-]?(?:[0-9]+[.,]?[0-9]*|[.,][0-9]+)(?:e[+-]?[0-9]+)?$/i;
const GROUPED = /^[+-]?[0-9]{1,3}(?: [0-9]{3})+(?:[.,][0-9]+)?$/;
const COMMA_THREE = /^([+-]?[0-9]*),([0-9]{3})(e.*)?$/i;

/** One kind of space, minus and micro sign; a power of ten as an exponent. */
const plainText = (text: string) =>
  text
    .replace(/[\s\u00a0\u2007\u2009\u202f\u2060]+/g, " ")
    .replace(/[\u2212\u2010-\u2013\ufe63\uff0d]/g, "-")
    .replace(/[\u00b5\u03bc]/g, "u")
    .trim()
    .replace(/^([+-]?) ?10 ?\^ ?([+-]?[0-9]+)/, (_, sign, exponent) => `${sign}1e${exponent}`)
    .replace(/ ?[x×*·] ?10 ?\^ ?([+-]?[0-9]+)/i, "e$1");

function readNumber(typed: string): Reading {
  const text = typed.replace(/^([+-]) /, "$1");
  const marks = text.replace(/[^.,]/g, "").length;
  if (marks > 1) return { problem: `“${text}” has two decimal marks. Write the thousands with a space: 1 234.5.` };
  const asked = COMMA_THREE.exec(text.replace(/ /g, ""));
  if (asked) return { problem: commaQuestion(text, asked) };
  if (!PLAIN.test(text) && !GROUPED.test(text)) {
    return { problem: `“${text}” reads as more than one number. A space parts groups of three figures only: 12 345.` };
  }
  const value = Number(text.replace(/ /g, "").replace(",", "."));
  if (!Number.isFinite(value)) return { problem: `${text} is too large to be a quantity here.` };
  return { value };
}

function commaQuestion(text: string, [, whole, rest, exponent = ""]: RegExpExecArray): string {
  const point = `${whole}.${rest}${exponent}`;
  const thousands = `${whole}${rest}${exponent}`;
  return `Is the comma in ${text} a decimal mark or does it part the thousands? Write ${point} or ${thousands}.`;
}

function readUnit(typed: string | undefined, unit: Unit): { unit: Unit } | { problem: string } {
  if (!typed) return { unit };
  const name = typed.trim();
  const found = unitNamed(name);
  if (!found) return { problem: `“${name}” is not a unit known here. ${wanted(unit)}` };
  if (!isConvertible(found, unit)) return { problem: `${formatUnit(found)} does not fit. ${wanted(unit)}` };
  return { unit: found };
}

const wanted = (unit: Unit) => (unit === "1" ? "This is a plain number." : `This quantity is in ${formatUnit(unit)}.`);
