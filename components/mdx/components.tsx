import type { ComponentType, FunctionComponent } from "react";
import { StandingCalculator } from "@/components/calculators/StandingCalculator";
import { CALCULATORS, type CalculatorTag } from "@/lib/calculators/calculators";
import { Caution } from "./Caution";
import { CheckCard } from "./CheckCard";

/** One component for each tag of the module language. The tree holds numbers in the unit of their attribute. */
export const components = {
  ...calculators(),
  Check: CheckCard,
  // What is asked is shown on the card of its check; givens are drawn, and wrong ways are nobody's business beforehand.
  Quantity: () => null,
  Given: () => null,
  Wrong: () => null,
  Caution,
} as const satisfies Record<string, ComponentType<never>>;

function calculators() {
  const entries = CALCULATORS.map(({ tag, inputs }) => [
    tag,
    (attributes: Record<string, unknown>) => {
      // Other inputs in the text are another calculator: a lead sees at once what was changed.
      const written = inputs.map(({ attribute }) => attributes[attribute]).join("|");
      return <StandingCalculator key={written} tag={tag} attributes={attributes} />;
    },
  ]);
  return Object.fromEntries(entries) as Record<CalculatorTag, FunctionComponent<Record<string, unknown>>>;
}
