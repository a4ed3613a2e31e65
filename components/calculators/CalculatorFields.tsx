"use client";
import { useId } from "react";
import { TwoWay } from "@/components/ui/TwoWay";
import type { Calculator, CalculatorInput, InputValue, ValuesOf } from "@/lib/calculators/calculator";
import { valueAt } from "@/lib/calculators/link";
import type { CalculatorProps } from "./calculatorProps";
import { FigureField } from "./FigureField";

type CalculatorFieldsProps<C extends Calculator> = CalculatorProps<C> & {
  of: C;
  /** Only these, in the order of the description; left out, all but the lists. */
  keys?: readonly (keyof ValuesOf<C>)[];
};

/** The fields of a calculator, from its description. */
export function CalculatorFields<C extends Calculator>({ of, keys, values, onChange }: CalculatorFieldsProps<C>) {
  return of.inputs
    .filter(({ key }) => !keys || keys.includes(key as keyof ValuesOf<C>))
    .map((input) => (
      <InputField
        key={input.key}
        input={input}
        value={valueAt(values, input.key)}
        onChange={(value) => onChange({ ...values, [input.key]: value })}
      />
    ));
}

type InputFieldProps = { input: CalculatorInput; value: InputValue; onChange: (value: InputValue) => void };

function InputField({ input, value, onChange }: InputFieldProps) {
  const group = useId();
  if (input.input === "rows") return null;
  if (input.input === "number")
    return (
      <FigureField
        label={input.label}
        bounds={input}
        unit={input.unit}
        value={value as number | null}
        onChange={onChange}
      />
    );
  return (
    <TwoWay
      name={group}
      label={input.label}
      showLabel
      choices={input.choices}
      value={value as string}
      onChange={onChange}
      className="col-span-full"
    />
  );
}
