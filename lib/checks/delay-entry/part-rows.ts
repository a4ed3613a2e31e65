import { cableDelayNs } from "@/lib/gnss/chain/cableDelay";
import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import type { DelayEntryTruth } from "./drawCase";
import type { OwnValues } from "./ownValues";
import type { SitePart } from "./site";
import { toleranceNs } from "./toleranceNs";

/** The two echoes, against the times that were put into the traces. */
export function markEchoes({ echoes }: DelayEntryTruth, quantity: AskedQuantity, answers: Answers): MarkedRow[] {
  const { leadNs, endNs } = echoes;
  const row = (id: string, label: string, computed: number): MarkedRow =>
    markNumber({
      quantity,
      subject: label,
      label,
      typed: answerOf(answers, `trace.${id}`),
      computed,
      unit: "ns",
      decimals: 1,
      tolerance: quantity.tolerance,
      explain: (value) => explainEcho(value, computed, quantity.tolerance),
    });
  return [row("lead", "Echo, test lead alone", leadNs), row("end", "Echo, run connected", endNs)];
}

const explainEcho = (value: number, computed: number, tolerance: number): Finding | null =>
  Math.abs(2 * value - computed) <= 2 * tolerance
    ? {
        errorClass: "one way for there and back",
        reason: "This is half of the echo's time; the time read off the trace was asked.",
      }
    : null;

/** One row a part; the measured run from the candidate's own echoes, where they can be read. */
export const markParts = (
  truth: DelayEntryTruth,
  quantity: AskedQuantity,
  answers: Answers,
  own: OwnValues,
): MarkedRow[] =>
  truth.parts.map((part, n) => {
    const measured = part.paper.says === "nothing";
    const computed = measured && own.runNs !== null ? own.runNs : truth.delaysNs[n];
    const tolerance = toleranceNs(quantity.tolerance, computed);
    const name = `${part.id.toUpperCase()} ${part.name}`;
    return markNumber({
      quantity,
      subject: name,
      label: name,
      typed: answerOf(answers, `parts.${part.id}`),
      computed,
      unit: "ns",
      decimals: 1,
      tolerance,
      explain: (value) => explainPart({ part, truth, computed, value, tolerance }),
    });
  });

type Part = { part: SitePart; truth: DelayEntryTruth; computed: number; value: number; tolerance: number };

function explainPart({ part, truth, computed, value, tolerance }: Part): Finding {
  const near = (other: number) => Math.abs(value - other) <= tolerance;
  if (truth.delaysNs[truth.parts.indexOf(part)] === 0) {
    return {
      errorClass: "not on the way",
      reason: `It runs from ${part.from} to ${part.to}: the pulse does not pass it.`,
    };
  }
  if (near(0)) return { errorClass: "part left out", reason: `The pulse passes it, ${part.from} to ${part.to}.` };
  if (near(-computed))
    return { errorClass: "sign", reason: "Each part makes the pulse later, so its delay is positive." };
  if (part.paper.says === "cable") return explainCable(part.paper, near, computed);
  if (part.paper.says === "nothing") return explainRun(truth, near, computed);
  return { errorClass: null, reason: `Its sheet says ${formatUnderstood(part.paper.ns, "ns")}.` };
}

type Cable = SitePart["paper"] & { says: "cable" };

function explainCable(
  { installedM, reelM, velocityFactor }: Cable,
  near: (ns: number) => boolean,
  computed: number,
): Finding {
  const perM = cableDelayNs(1, velocityFactor);
  const worked = `${formatUnderstood(installedM, "m")} at ${formatNumber(perM, 3)}\u00a0ns/m is ${formatQuantity(computed, "ns", 1)}.`;
  if (reelM !== null && near(cableDelayNs(reelM, velocityFactor))) {
    return { errorClass: "drum length", reason: `The drum held ${formatUnderstood(reelM, "m")}; ${worked}` };
  }
  if (near(cableDelayNs(installedM, 1))) {
    return {
      errorClass: "speed of light in air",
      reason: `A wave in this cable runs at ${formatUnderstood(velocityFactor, "1")} of it: ${worked}`,
    };
  }
  if (near(computed * velocityFactor * velocityFactor)) {
    return { errorClass: "velocity factor turned over", reason: `Divide by the velocity factor: ${worked}` };
  }
  return { errorClass: null, reason: worked };
}

function explainRun({ echoes }: DelayEntryTruth, near: (ns: number) => boolean, computed: number): Finding {
  const worked = `Half of the difference of the two echoes is ${formatQuantity(computed, "ns", 1)}.`;
  if (near(2 * computed)) return { errorClass: "echo not halved", reason: `The echo runs there and back. ${worked}` };
  if (near(echoes.endNs / 2))
    return { errorClass: "test lead left in", reason: `The test lead is no part of the run. ${worked}` };
  return { errorClass: null, reason: worked };
}
