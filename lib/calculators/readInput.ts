import type { CalculatorInput } from "./calculator";
import { readFigure, type ReadInput } from "./readFigure";
import { readRows } from "./readRows";

/** What a person, a link or a module has written for an input; or the rule it breaks, with its reason. */
export function readInput(input: CalculatorInput, text: string): ReadInput {
  switch (input.input) {
    case "number":
      return readFigure(input, input.unit, text);
    case "choice": {
      const chosen = input.choices.find(({ value }) => value === text.trim());
      if (chosen) return { value: chosen.value };
      return { problem: `${input.label} is one of ${input.choices.map(({ value }) => value).join(", ")}.` };
    }
    case "rows":
      return readRows(input, text);
  }
}
