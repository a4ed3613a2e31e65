import { expect, test } from "vitest";
import { startValues, type Calculator } from "@/lib/calculators/calculator";
import { CALCULATORS } from "@/lib/calculators/calculators";
import { moduleText, valuesOfAttributes } from "@/lib/calculators/moduleText";
import { TWO_CODES } from "@/lib/calculators/twoCodes";
import type { TreeElement } from "@/lib/mdx/moduleTree";
import { parseModule } from "@/lib/mdx/parseModule";

const ALL: readonly Calculator[] = CALCULATORS;

const readBack = (text: string) => {
  const { tree, problems } = parseModule(`Before.\n\n${text}\n\nAfter.`);
  expect(problems.filter(({ rule }) => rule !== "front-matter")).toEqual([]);
  return tree?.children.find((node): node is TreeElement => node.type === "element" && /^[A-Z]/.test(node.tagName));
};

test.each(ALL.map((calculator) => [calculator.tag, calculator] as const))(
  "what <%s> copies for a module is taken there and means the same",
  (tag, calculator) => {
    const values = startValues(calculator);
    const element = readBack(moduleText(calculator, values));
    expect(element?.tagName).toBe(tag);
    expect(valuesOfAttributes(calculator, element!.properties)).toEqual(values);
  },
);

test("figures go into a module with their unit and to the last place; what is empty stays out", () => {
  const values = { ...startValues(TWO_CODES), dopplerHz: -1234.5678901234 };
  const text = moduleText(TWO_CODES, values);
  expect(text).toBe('<TwoCodes a={7} b={19} doppler="-1234.5678901234 Hz" coherent="1 ms" />');
  expect(valuesOfAttributes(TWO_CODES, readBack(text)!.properties)).toEqual(values);
});
