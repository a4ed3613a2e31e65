import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { formatUnderstood } from "../formatUnderstood";
import type { CaseFile, CheckPlan, FieldSpec, FormSection, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import type { DelayEntryTruth } from "./drawCase";
import type { DelayEntryParameters } from "./parameters";
import { delayEntryCautions, delayEntryQuantities, LEAST_NS } from "./quantities";

/** Field by field: what the papers say of each part, and the two traces. */
export function publicCase(
  { parts, echoes, note }: DelayEntryTruth,
  plan: CheckPlan<DelayEntryParameters>,
): PublicCase {
  const asked = askedQuantities(delayEntryQuantities, plan);
  const { stepNs, leadTrace, endTrace } = echoes;
  const sections: FormSection[] = [
    { id: "trace", title: "Echoes", fields: TRACE_FIELDS },
    {
      id: "parts",
      title: "Delay of each part, 0 if not on the way",
      fields: parts.map(({ id, name }) => partField(id, name)),
    },
    { id: "entry", title: "What you enter", fields: ENTRY_FIELDS },
  ];
  return {
    kind: "delay-entry",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Pulse has to be right at", value: "the clock input" },
      { label: "Receiver's sheet", value: note },
      { label: "Receiver holds now", value: formatUnderstood(0, "ns") },
      { label: "Parts listed", value: String(parts.length) },
    ],
    cautions: [...delayEntryCautions],
    sections: sections
      .map((section) => ({ ...section, fields: section.fields.filter(({ quantity }) => asked.has(quantity)) }))
      .filter(({ fields }) => fields.length > 0),
    tolerances: publicTolerances(asked, {
      parts: relative,
      total: relative,
      entry: relative,
      uncertainty: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")}`,
    }),
    data: {
      parts: parts.map(({ id, name, from, to, paper, uncertainty }) => ({
        id,
        name,
        from,
        to,
        paper: { ...paper }, // whole: a paper holds what is printed on it and nothing else
        uncertainty: { as: uncertainty.as, value: uncertainty.value, unit: uncertainty.unit },
      })),
      note,
      stepNs,
      leadTrace,
      endTrace,
      echoFile: ECHO_FILE,
    },
  };
}

const relative = ({ tolerance }: AskedQuantity) =>
  `±${formatUnderstood(tolerance, "%")}, at least ±${formatUnderstood(LEAST_NS, "ns")}`;

const ECHO_FILE = "echo.csv";

/** Both traces as numbers, for a spreadsheet. */
export function echoFile({ echoes: { stepNs, leadTrace, endTrace } }: DelayEntryTruth): CaseFile {
  const lines = leadTrace.map((lead, n) => `${(n * stepNs).toFixed(1)},${lead.toFixed(3)},${endTrace[n].toFixed(3)}`);
  const text = ["time_ns,test_lead_alone,run_connected", ...lines, ""].join("\r\n");
  return { name: ECHO_FILE, mediaType: "text/csv", bytes: new TextEncoder().encode(text) };
}

const BRIEF = [
  "Work out what to enter in a timing receiver so that its pulse is right at the clock input. The list of parts says what each part is connected to and what its papers say. Not every part is on the pulse's way.",
  "The run in the building has no papers. A reflectometer was connected to it by a test lead: one trace is of the test lead alone, its far end open, the other with the run connected and open at its far end. The edge is sent at 0 ns; an echo's time is where the trace is half-way up.",
  "A cable was cut from its drum: installed is the length that was pulled in.",
  "± means limits, all values between alike. u means a standard uncertainty. A per cent is of the part's delay. The parts err independently, and a part that does not count adds no uncertainty.",
];

const TRACE_FIELDS: readonly FieldSpec[] = [
  { id: "lead", label: "Echo, test lead alone", input: "number", unit: "ns", quantity: "echo" },
  { id: "end", label: "Echo, run connected", input: "number", unit: "ns", quantity: "echo" },
];

const partField = (id: string, name: string): FieldSpec => ({
  id,
  label: `${id.toUpperCase()} ${name}`,
  input: "number",
  unit: "ns",
  quantity: "parts",
});

const ENTRY_FIELDS: readonly FieldSpec[] = [
  { id: "total", label: "Total delay", input: "number", unit: "ns", quantity: "total" },
  {
    id: "value",
    label: "Value to enter, with its sign",
    input: "number",
    unit: "ns",
    signed: true,
    help: "As the receiver's sheet wants it.",
    quantity: "entry",
  },
  {
    id: "uncertainty",
    label: "Standard uncertainty of the total",
    input: "number",
    unit: "ns",
    quantity: "uncertainty",
  },
];
