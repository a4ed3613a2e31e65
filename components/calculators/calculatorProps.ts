import type { Calculator, ValuesOf } from "@/lib/calculators/calculator";

/** What the body of a calculator is given. Its inputs are kept by whoever shows it: the bench, a module, a case. */
export type CalculatorProps<C extends Calculator> = {
  values: ValuesOf<C>;
  onChange: (values: ValuesOf<C>) => void;
};
