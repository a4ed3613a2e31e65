import type { ParameterSpec } from "./kind";
import { formatUnderstood } from "./formatUnderstood";
import { parseQuantity } from "./parseQuantity";

/** What an attribute may hold after the module language has read it. */
export type WrittenParameter = string | number | readonly number[];
export type ParameterProblem = { name: string; message: string };
type ParameterValue = number | string | readonly [number, number];
export type ReadParameters = { parameters: Record<string, ParameterValue>; problems: ParameterProblem[] };

/**
 * Turns the attributes of a `<Check>` into a kind's parameters, each in the unit of its specification. What is not written
 * takes its default. A range is written `"34 to 43 dB-Hz"` or `{[34, 43]}`.
 */
export function readParameters(
  specs: readonly ParameterSpec[],
  written: Readonly<Record<string, unknown>>,
): ReadParameters {
  const parameters: Record<string, ParameterValue> = {};
  const problems: ParameterProblem[] = [];
  for (const name of Object.keys(written)) {
    if (!specs.some((spec) => spec.name === name)) problems.push({ name, message: unknownName(name, specs) });
  }
  for (const spec of specs) {
    const value = Object.hasOwn(written, spec.name) ? readParameter(spec, written[spec.name]) : { value: spec.default };
    if ("problem" in value) problems.push({ name: spec.name, message: value.problem });
    else parameters[spec.name] = value.value;
  }
  return { parameters, problems };
}

type ParameterReading = { value: ParameterValue } | { problem: string };

function readParameter(spec: ParameterSpec, written: unknown): ParameterReading {
  if (spec.input === "choice") return readChoice(spec, written);
  if (spec.input === "number") return readWithin(spec, written);
  const ends = rangeEnds(written);
  if (!ends) return { problem: `${spec.label} is a range: write ${example(spec)}.` };
  const [from, to] = ends.map((end) => readWithin(spec, end));
  if ("problem" in from) return from;
  if ("problem" in to) return to;
  if (!(from.value <= to.value))
    return { problem: `${spec.label} runs from the smaller to the larger value: ${example(spec)}.` };
  return { value: [from.value, to.value] };
}

function readChoice(spec: ParameterSpec & { input: "choice" }, written: unknown): ParameterReading {
  const found = spec.choices.find((choice) => choice.value === written || choice.value === String(written));
  if (found) return { value: found.value };
  return { problem: `${spec.label} is one of ${spec.choices.map((choice) => choice.value).join(", ")}.` };
}

type Bounded = ParameterSpec & { input: "number" | "range" };

function readWithin(spec: Bounded, written: unknown): { value: number } | { problem: string } {
  const reading =
    typeof written === "string" ? parseQuantity(written, spec.unit) : { value: Number(numberOnly(written)) };
  if ("problem" in reading) return { problem: `${spec.label}: ${reading.problem}` };
  if (!(reading.value >= spec.from && reading.value <= spec.to)) {
    const [from, to] = [spec.from, spec.to].map((end) => formatUnderstood(end, spec.unit));
    return { problem: `${spec.label} may be from ${from} to ${to}.` };
  }
  if (spec.whole && !Number.isInteger(reading.value)) return { problem: `${spec.label} is a whole number.` };
  return reading;
}

const numberOnly = (written: unknown) => (typeof written === "number" ? written : NaN);

/** The unit behind the second end holds for both ends: "34 to 43 dB-Hz". */
function rangeEnds(written: unknown): [string | number, string | number] | null {
  if (Array.isArray(written)) return written.length === 2 ? [written[0], written[1]] : null;
  if (typeof written === "number") return [written, written];
  if (typeof written !== "string") return null;
  const ends = written.split(/\s+to\s+/);
  if (ends.length === 1) return [ends[0], ends[0]];
  if (ends.length !== 2) return null;
  const unit = /[^0-9.,\s].*$/.exec(ends[1].replace(/^[\s+\u2212-]+/, ""))?.[0] ?? "";
  return [/[a-zµ%]/i.test(ends[0]) ? ends[0] : `${ends[0]} ${unit}`, ends[1]];
}

const example = (spec: ParameterSpec & { input: "range" }) =>
  `"${formatUnderstood(spec.default[0], "1")} to ${formatUnderstood(spec.default[1], spec.unit)}"`;

const unknownName = (name: string, specs: readonly ParameterSpec[]) => {
  const known = specs.length > 0 ? `It has ${specs.map((spec) => spec.name).join(", ")}.` : "Delete it.";
  return `This kind of check has no attribute ${name}. ${known}`;
};
