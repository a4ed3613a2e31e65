import { askedQuantities } from "../askedQuantities";
import { formatNumber } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CaseFile, CheckPlan, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import { WEAK_DB_HZ, type Cn0Truth } from "./drawCase";
import { PROMPTS } from "./drawPrompts";
import type { Cn0Parameters } from "./parameters";
import { cn0Cautions, cn0Quantities, METHOD_CHOICES } from "./quantities";

/** Field by field: prompts and satellites, nothing of what was put in. */
export function publicCase({ channels }: Cn0Truth, plan: CheckPlan<Cn0Parameters>): PublicCase {
  const asked = askedQuantities(cn0Quantities, plan);
  const fields = [...channels.map(({ prn }, n) => levelField(n, prn)), METHOD_FIELD];
  return {
    kind: "cn0",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Signal", value: "GPS L1 C/A, 50 bit/s" },
      { label: "Prompts", value: `${formatNumber(PROMPTS, 0)} a channel, one code period of 1\u00a0ms each` },
      { label: "Channels", value: channels.map(({ prn }, n) => `${n + 1}: PRN ${prn}`).join("; ") },
      { label: "Data bits", value: "20\u00a0ms long, edges unknown" },
      { label: "Residual of the carrier", value: "constant, within ±5\u00a0Hz" },
    ],
    cautions: [...cn0Cautions],
    sections: [
      { id: "channels", title: "C/N0 by channel", fields: fields.filter(({ quantity }) => asked.has(quantity)) },
    ],
    tolerances: publicTolerances(asked, {
      cn0: ({ tolerance }) =>
        `±${formatUnderstood(tolerance, "dB")} from ${WEAK_DB_HZ}\u00a0dB-Hz on, ±${formatUnderstood(2 * tolerance, "dB")} below`,
    }),
    data: {
      periodMs: 1,
      channels: channels.map(({ prn, prompts }) => ({
        prn,
        i: prompts.filter((_, at) => at % 2 === 0),
        q: prompts.filter((_, at) => at % 2 === 1),
      })),
      promptsFile: PROMPTS_FILE,
    },
  };
}

const PROMPTS_FILE = "prompts.csv";

/** The same numbers as the plots, for a spreadsheet or a program. */
export function promptsFile({ channels }: Cn0Truth): CaseFile {
  const head = ["ms", ...channels.flatMap((_, n) => [`ch${n + 1}_i`, `ch${n + 1}_q`])].join(",");
  const lines = Array.from({ length: PROMPTS }, (_, ms) =>
    [ms, ...channels.flatMap(({ prompts }) => [prompts[2 * ms], prompts[2 * ms + 1]])].join(","),
  );
  const text = [head, ...lines, ""].join("\r\n");
  return { name: PROMPTS_FILE, mediaType: "text/csv", bytes: new TextEncoder().encode(text) };
}

const BRIEF = [
  "Each channel gives the I and Q of its prompt correlator, one pair a millisecond for 2 s, in counts of its own scale. The code is tracked; the carrier still turns by a constant residual.",
  "Give C/N0 of every channel in dB-Hz, as a mean over the 2 s, and the method that you used for the weakest of them. Noise is white and the same in I and Q.",
  "The file holds all prompts; take it into a spreadsheet or a program of your own.",
];

const levelField = (n: number, prn: number): FieldSpec => ({
  id: `ch${n + 1}`,
  label: `Channel ${n + 1}, PRN ${prn}`,
  input: "number",
  unit: "dB-Hz",
  quantity: "cn0",
});

const METHOD_FIELD: FieldSpec = {
  id: "method",
  label: "Method for the weakest channel",
  input: "choice",
  choices: METHOD_CHOICES,
  quantity: "method",
};
