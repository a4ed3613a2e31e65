import type { Given } from "./parameters";

/** Figures behind the point of a number as people write it: 0.05 has two, 1e-9 nine. */
export function decimalsOf(value: number): number {
  const [figures, exponent = "0"] = String(value).split("e");
  const written = figures.split(".")[1]?.length ?? 0;
  return Math.max(0, written - Number(exponent));
}

/** Figures that show every value of a given exactly. */
export const decimalsOfGiven = ({ from, step }: Given): number => Math.max(decimalsOf(from), decimalsOf(step));

/** How many steps lead from the first value to the last; NaN where `to` is on none of them. */
export function stepsOf({ from, to, step }: Given): number {
  const steps = Math.round((to - from) / step);
  return Math.abs(from + steps * step - to) <= step * 1e-6 ? steps : NaN;
}

/** The value after so many steps: the very number that its decimal text says, so that a technician computes with the same. */
export const givenValue = (given: Given, steps: number): number =>
  Number((given.from + steps * given.step).toFixed(decimalsOfGiven(given)));
