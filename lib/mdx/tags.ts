import type { CautionTopic } from "@/lib/checks/kind";
import type { ChoiceInput, RowsInput } from "@/lib/calculators/calculator";
import type { Unit } from "@/lib/gnss/units";
import { CALCULATOR_TAGS } from "@/lib/mdx/calculatorTags";

/** How the value of an attribute is read. A number may be bare, in the unit given, or in quotes with a unit of its own. */
export type AttributeSpec = { name: string; help: string; sample: string; required?: true } & (
  | { input: "number"; unit: Unit; from: number; to: number; whole?: true }
  // A symbol is a name that can stand in a formula; a quantity is a number whose unit stands in another attribute.
  | { input: "name" | "symbol" | "unit" | "quantity" | "text" | "flag" | "topics" }
  // A word of a list or the rows of a table: the calculator's own description says how it is read.
  | { input: "described"; of: ChoiceInput | RowsInput }
);

export type TagSpec = {
  name: string;
  help: string;
  attributes: readonly AttributeSpec[];
  /** Attributes beyond the list belong to the kind named by `kind` and are read with it. */
  kindAttributes?: true;
  inside: "nothing" | "text";
  /** Checks stand between the parts of the text, quantities inside a check, the rest wherever a paragraph may. */
  place: "top" | "check" | "block";
};

export const CAUTION_TOPICS = [
  "height",
  "lightning",
  "mains",
  "rf",
  "transmit",
  "life",
] as const satisfies readonly CautionTopic[];

export const TAGS = {
  ...CALCULATOR_TAGS,
  Check: {
    name: "Check",
    help: "A practical check; the text inside is its brief",
    inside: "text",
    place: "top",
    kindAttributes: true,
    attributes: [
      { name: "id", help: "name of the check in this module", sample: '"satellites"', input: "name", required: true },
      { name: "kind", help: "kind of check", sample: '"satellites"', input: "name", required: true },
      {
        name: "minutes",
        help: "time from opening the case to the hand-in",
        sample: "{40}",
        input: "number",
        unit: "1",
        from: 5,
        to: 240,
        whole: true,
      },
      {
        name: "needs",
        help: "quantities that must be within; all of them if left out",
        sample: "{3}",
        input: "number",
        unit: "1",
        from: 1,
        to: 40,
        whole: true,
      },
    ],
  },
  Quantity: {
    name: "Quantity",
    help: "One quantity of the check that is judged; without any, all of its kind are",
    inside: "nothing",
    place: "check",
    // Which of these are needed depends on the kind of the check: see planQuantities and planFormula.
    attributes: [
      { name: "of", help: "quantity of the kind", sample: '"doppler"', input: "name" },
      { name: "id", help: "own quantity: its name in formulas", sample: '"delay"', input: "symbol" },
      { name: "label", help: "own quantity: what is asked", sample: '"cable delay"', input: "text" },
      { name: "unit", help: "own quantity: unit of the answer", sample: '"ns"', input: "unit" },
      { name: "answer", help: "own quantity: formula of the right value", sample: '"L / (0.66 * c)"', input: "text" },
      {
        name: "tolerance",
        help: "largest difference that is within, with its unit",
        sample: '"0.5 chip"',
        input: "text",
      },
      { name: "critical", help: "outside this quantity the check is not met", sample: "{true}", input: "flag" },
    ],
  },
  Given: {
    name: "Given",
    help: "A number that is drawn for each case, for the formulas of the check",
    inside: "nothing",
    place: "check",
    attributes: [
      { name: "id", help: "its name in formulas", sample: '"L"', input: "symbol", required: true },
      { name: "label", help: "what it is", sample: '"cable length"', input: "text", required: true },
      { name: "unit", help: "its unit, 1 for a plain number", sample: '"m"', input: "unit", required: true },
      { name: "from", help: "smallest value", sample: "{8}", input: "quantity", required: true },
      { name: "to", help: "largest value, from plus whole steps", sample: "{120}", input: "quantity", required: true },
      { name: "step", help: "from one value to the next", sample: "{0.5}", input: "quantity", required: true },
    ],
  },
  Wrong: {
    name: "Wrong",
    help: "A known wrong way to a quantity, named on the marking record of whoever went it",
    inside: "nothing",
    place: "check",
    attributes: [
      { name: "id", help: "its name in this check", sample: '"air"', input: "name", required: true },
      { name: "label", help: "what was done wrong", sample: '"speed of light in air"', input: "text", required: true },
      { name: "of", help: "the quantity it leads to", sample: '"delay"', input: "symbol", required: true },
      { name: "answer", help: "formula of the wrong value", sample: '"L / c"', input: "text", required: true },
    ],
  },
  Caution: {
    name: "Caution",
    help: "Standing cautions; the text inside is added to them",
    inside: "text",
    place: "block",
    attributes: [
      {
        name: "about",
        help: `one or more of ${CAUTION_TOPICS.join(", ")}`,
        sample: '"height lightning"',
        input: "topics",
        required: true,
      },
    ],
  },
} as const satisfies Record<string, TagSpec>;

export type TagName = keyof typeof TAGS;

export function tagNamed(name: string): TagSpec | null {
  return Object.hasOwn(TAGS, name) ? TAGS[name as TagName] : null;
}

/** Tags of the language that this release does not have yet. */
export const LATER_TAGS: readonly string[] = [
  "ExpectedCn0",
  "PromptCn0",
  "EffectiveCn0",
  "StandOff",
  "MixProducts",
  "MultipathError",
  "SkyMask",
  "WitnessLine",
  "Figure",
];

/** Every kind that the language names; one that is not in the registry of kinds is not available in this release. */
export const LANGUAGE_KINDS: readonly string[] = [
  "correlator-reading",
  "false-lock",
  "side-peak",
  "satellites",
  "search-plan",
  "cn0",
  "lost-decibels",
  "chain",
  "sky-view",
  "witnessed",
  "interferer",
  "stand-off",
  "locate",
  "jammed-or-not",
  "multipath-log",
  "delay-entry",
  "pulse-acceptance",
  "log-timeline",
  "own-capture",
  "formula",
  "written",
];
