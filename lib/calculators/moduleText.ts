import { startValues, type Calculator, type CalculatorInput, type InputValue, type ValuesOf } from "./calculator";
import { inputText } from "./inputText";
import { valueAt } from "./link";
import { readInput } from "./readInput";

/** The tag that stands for this calculator with these inputs in a module, as a lead may paste it. */
export function moduleText<C extends Calculator>(calculator: C, values: ValuesOf<C>): string {
  const attributes = calculator.inputs.map((input) => attributeText(input, valueAt(values, input.key)));
  return `<${[calculator.tag, ...attributes.filter((text) => text !== "")].join(" ")} />`;
}

const attributeText = (input: CalculatorInput, value: InputValue): string =>
  value === null ? "" : `${input.attribute}=${attributeValueText(input, value)}`;

/** A number with a unit in quotes, a bare one in braces, anything else in quotes. */
export function attributeValueText(input: CalculatorInput, value: InputValue): string {
  const text = inputText(input, value);
  if (input.input !== "number") return `"${text}"`;
  return input.unit === "1" ? `{${text}}` : `"${text} ${input.unit}"`;
}

/** Values from the attributes of a tag that the module language has passed: numbers in the input's unit, all else as text. */
export function valuesOfAttributes<C extends Calculator>(
  calculator: C,
  attributes: Record<string, unknown>,
): ValuesOf<C> {
  const values: Record<string, InputValue> = { ...startValues(calculator) };
  for (const input of calculator.inputs) {
    const written = attributes[input.attribute];
    if (typeof written !== "string" && typeof written !== "number") continue;
    const read = readInput(input, String(written));
    if ("value" in read) values[input.key] = read.value;
  }
  return values as ValuesOf<C>;
}
