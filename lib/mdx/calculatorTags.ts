import type { CalculatorInput } from "@/lib/calculators/calculator";
import { CALCULATORS, type BenchCalculator, type CalculatorTag } from "@/lib/calculators/calculators";
import { attributeValueText } from "@/lib/calculators/moduleText";
import type { AttributeSpec, TagSpec } from "@/lib/mdx/tags";

/** One tag for each calculator of the bench, from the description that its fields and its link follow too. */
export const CALCULATOR_TAGS = Object.fromEntries(
  CALCULATORS.map((calculator) => [calculator.tag, tagOf(calculator)]),
) as Record<CalculatorTag, TagSpec>;

function tagOf({ tag, name, question, inputs }: BenchCalculator): TagSpec {
  return {
    name: tag,
    help: `${name}: ${question}`,
    inside: "nothing",
    place: "block",
    attributes: inputs.map(attributeOf),
  };
}

function attributeOf(input: CalculatorInput): AttributeSpec {
  const { attribute: name, help } = input;
  if (input.input !== "number") {
    return { name, help, sample: attributeValueText(input, input.start), input: "described", of: input };
  }
  const { unit, from, to, whole, start } = input;
  const sample = attributeValueText(input, start ?? from);
  return { name, help, sample, input: "number", unit, from, to, ...(whole && { whole }) };
}
