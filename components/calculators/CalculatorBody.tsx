import type { ComponentType } from "react";
import type { Calculator } from "@/lib/calculators/calculator";
import type { CalculatorTag } from "@/lib/calculators/calculators";
import { BODIES } from "./bodies";
import type { CalculatorProps } from "./calculatorProps";

/** The body under a tag; values and tag come from the same description, which the types cannot see through a variable. */
export function CalculatorBody({ tag, ...props }: CalculatorProps<Calculator> & { tag: CalculatorTag }) {
  const Body = BODIES[tag] as unknown as ComponentType<CalculatorProps<Calculator>>;
  return <Body {...props} />;
}
