import type { Unit } from "@/lib/gnss/units";

type Described = {
  /** Name in the program. */
  key: string;
  /** Name in a link's query and in a module's text. */
  attribute: string;
  /** Over the field. */
  label: string;
  /** What it is, in the editor of modules. */
  help: string;
};

/** What every figure that is typed in has: its range, and why it ends there. */
export type Bounded = {
  from: number;
  to: number;
  /** Figures after the point that are shown at least. */
  decimals: number;
  /** Reason for the range: the sentence that follows a refusal. */
  why?: string;
  whole?: true;
  signed?: true;
  /** Very small values read better as a power of ten. */
  scientific?: true;
  /** May stay empty; what that means. */
  absent?: string;
};

/** One figure with its unit. One that may stay empty is empty at the start. */
export type NumberInput = Described & Bounded & { input: "number"; unit: Unit; start: number | null };

/** One of a few words. */
export type ChoiceInput = Described & {
  input: "choice";
  choices: readonly { value: string; label: string }[];
  start: string;
};

/** A figure of each row of a list, in the place that the list of columns gives it. */
export type Column = Bounded & { key: string; label: string; unit: Unit; start: number | null };

/** A list of named things with the same figures each. */
export type RowsInput = Described & {
  input: "rows";
  /** What one row is: "part". */
  row: string;
  columns: readonly Column[];
  most: number;
  start: readonly Row[];
};

export type Row = { readonly name: string; readonly figures: readonly (number | null)[] };

export type CalculatorInput = NumberInput | ChoiceInput | RowsInput;
export type InputValue = number | null | string | readonly Row[];

/** A calculator of the bench, described once: fields, link, module text, memory and tag all follow from this. */
export type Calculator = {
  /** In the address of the bench. */
  id: string;
  /** In a module's text. */
  tag: string;
  /** K number, as technicians quote it. */
  number: number;
  name: string;
  question: string;
  inputs: readonly CalculatorInput[];
};

export type ValueOf<I extends CalculatorInput> = I extends RowsInput
  ? readonly Row[]
  : I extends ChoiceInput
    ? I["choices"][number]["value"]
    : I extends { absent: string }
      ? number | null
      : number;

/** Values of a calculator's inputs by key. */
export type ValuesOf<C extends Calculator> = { [I in C["inputs"][number] as I["key"]]: ValueOf<I> };

export function startValues<C extends Calculator>(calculator: C): ValuesOf<C> {
  return Object.fromEntries(calculator.inputs.map(({ key, start }) => [key, start])) as ValuesOf<C>;
}
