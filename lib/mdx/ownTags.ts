import type { CompletionRow } from "@/lib/mdx/completions";

/** What the editor offers inside a check that the lead defines: together they are a whole one. */
export const OWN_TAGS: Readonly<Record<string, CompletionRow[]>> = {
  formula: [
    {
      label: "<Given",
      detail: "a number drawn for each case",
      insert: '<Given id="L" label="cable length" unit="m" from={8} to={120} step={0.5} />',
    },
    {
      label: "<Quantity",
      detail: "what is asked, with the formula of the right value",
      insert: '<Quantity id="delay" label="cable delay" unit="ns" answer="L / (0.66 * c)" tolerance="1 ns" critical />',
    },
    {
      label: "<Wrong",
      detail: "a known wrong way, named on the marking record",
      insert: '<Wrong id="air" of="delay" label="speed of light in air" answer="L / c" />',
    },
  ],
  written: [
    {
      label: "<Quantity",
      detail: "a line that the technician writes and an assessor judges",
      insert: '<Quantity id="cause" label="what you think the cause is, and why" critical />',
    },
  ],
};
