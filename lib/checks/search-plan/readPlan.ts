import type { Unit } from "@/lib/gnss/units";
import { answerOf, isBlank } from "../answerOf";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers } from "../kind";
import { parseQuantity } from "../parseQuantity";
import type { Plan } from "./planGrid";

export type ReadPlan = { typed: string; plan: (Plan & { thresholdSigma2: number }) | null; problem: string };

type Bounds = { id: string; label: string; unit: Unit; from: number; to: number; whole: boolean };

/** What can be computed; wider than what is sensible, so that a bad plan is judged by what it attains. */
const FIELDS: readonly Bounds[] = [
  { id: "coherent", label: "Coherent time", unit: "ms", from: 0.1, to: 20, whole: false },
  { id: "sums", label: "Number of sums", unit: "1", from: 1, to: 500, whole: true },
  { id: "bin", label: "Doppler bin", unit: "Hz", from: 1, to: 2000, whole: false },
  { id: "step", label: "Code step", unit: "chip", from: 0.1, to: 1, whole: false },
  { id: "threshold", label: "Threshold", unit: "sigma2", from: 1e-3, to: 1e5, whole: false },
];

/** The plan as handed in, or the first field that keeps it from being computed. */
export function readPlan(answers: Answers): ReadPlan {
  const values: number[] = [];
  const texts = FIELDS.map(({ id }) => answerOf(answers, `plan.${id}`));
  const typed = texts.every(isBlank) ? "" : texts.map((text) => text.trim() || "–").join("; ");
  for (const [n, field] of FIELDS.entries()) {
    const reading = readField(field, texts[n]);
    if ("problem" in reading)
      return { typed, plan: null, problem: typed === "" ? reading.problem : `${field.label}: ${reading.problem}` };
    values.push(reading.value);
  }
  const [coherentMs, sums, dopplerBinHz, codeStepChips, thresholdSigma2] = values;
  return { typed, plan: { coherentMs, sums, dopplerBinHz, codeStepChips, thresholdSigma2 }, problem: "" };
}

function readField({ unit, from, to, whole }: Bounds, text: string) {
  const reading = parseQuantity(text, unit);
  if ("problem" in reading) return reading;
  if (!(reading.value >= from && reading.value <= to)) {
    return { problem: `from ${formatUnderstood(from, unit)} to ${formatUnderstood(to, unit)} can be computed.` };
  }
  return whole && !Number.isInteger(reading.value) ? { problem: "this is a whole number." } : reading;
}
