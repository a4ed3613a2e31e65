import { startValues, type Calculator, type InputValue, type ValuesOf } from "./calculator";
import { inputText } from "./inputText";
import { readInput } from "./readInput";

/** Query of the bench's address that opens this calculator with these inputs, every one of them. */
export function queryOf<C extends Calculator>(calculator: C, values: ValuesOf<C>): string {
  const query = new URLSearchParams({ open: calculator.id });
  for (const input of calculator.inputs) {
    const text = inputText(input, valueAt(values, input.key));
    if (text !== "") query.set(input.attribute, text);
  }
  return query.toString();
}

export type LinkReading<C extends Calculator> = {
  values: ValuesOf<C>;
  /** False for a link that names the calculator only. */
  carries: boolean;
  /** What could not be taken; the start value stands in its place. */
  problems: string[];
};

/** The inputs that a query carries; those it leaves out have their start values. */
export function readQuery<C extends Calculator>(calculator: C, query: URLSearchParams): LinkReading<C> {
  const values: Record<string, InputValue> = { ...startValues(calculator) };
  const problems: string[] = [];
  let carries = false;
  for (const input of calculator.inputs) {
    const text = query.get(input.attribute);
    if (text === null) continue;
    carries = true;
    const read = readInput(input, text);
    if ("value" in read) values[input.key] = read.value;
    else problems.push(`${input.label}: ${read.problem}`);
  }
  return { values: values as ValuesOf<C>, carries, problems };
}

export const valueAt = (values: object, key: string): InputValue => (values as Record<string, InputValue>)[key];
