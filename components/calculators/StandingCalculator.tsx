"use client";
import { useState } from "react";
import { calculatorTagged, type CalculatorTag } from "@/lib/calculators/calculators";
import { queryOf } from "@/lib/calculators/link";
import { valuesOfAttributes } from "@/lib/calculators/moduleText";
import { CalculatorBody } from "./CalculatorBody";

type StandingCalculatorProps = {
  tag: CalculatorTag;
  /** As a module gives them. */
  attributes?: Record<string, unknown>;
};

/** A calculator within other text: begins with what the text gives, keeps its inputs to itself, and can be opened on the bench. */
export function StandingCalculator({ tag, attributes = {} }: StandingCalculatorProps) {
  const calculator = calculatorTagged(tag);
  const [values, setValues] = useState(() => valuesOfAttributes(calculator, attributes));
  return (
    <>
      <CalculatorBody tag={tag} values={values} onChange={setValues} />
      <p className="mt-3 text-dense no-print">
        <a className="link" href={`/bench?${queryOf(calculator, values)}`} target="_blank" rel="noreferrer">
          Open on the bench with these inputs
        </a>
      </p>
    </>
  );
}
