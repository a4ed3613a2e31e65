import { entryValueNs } from "@/lib/gnss/timing/delayBudget";
import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatDifference } from "../formatDifference";
import { formatNumber, formatQuantity } from "../formatQuantity";
import type { Answers, MarkedRow } from "../kind";
import { markNumber } from "../markNumber";
import { budgetOf, standardNs, statedNs } from "./budget";
import { countedOf, type DelayEntryTruth } from "./drawCase";
import type { OwnValues } from "./ownValues";
import { toleranceNs } from "./toleranceNs";

type Marker = (truth: DelayEntryTruth, quantity: AskedQuantity, answers: Answers, own: OwnValues) => MarkedRow;

/** The sum of the candidate's own parts, where all of them can be read. */
export const markTotal: Marker = (truth, quantity, answers, { sumNs }) => {
  const computed = sumNs ?? truth.totalNs;
  return markNumber({
    quantity,
    typed: answerOf(answers, "entry.total"),
    computed,
    unit: "ns",
    decimals: 1,
    tolerance: toleranceNs(quantity.tolerance, computed),
    explain: () => ({
      errorClass: null,
      reason: `${sumNs === null ? "The parts" : "Your own parts"} add up to ${formatQuantity(computed, "ns", 1)}.`,
    }),
  });
};

/** The candidate's own total, with the sign that this receiver wants. */
export const markEntry: Marker = (truth, quantity, answers, own) => {
  const totalNs = own.totalNs ?? truth.totalNs;
  const computed = entryValueNs(totalNs, truth.sign);
  const tolerance = toleranceNs(quantity.tolerance, computed);
  return markNumber({
    quantity,
    typed: answerOf(answers, "entry.value"),
    computed,
    unit: "ns",
    decimals: 1,
    tolerance,
    explain: (value) => {
      const total = `${own.totalNs === null ? "The total" : "Your own total"} of ${formatQuantity(totalNs, "ns", 1)}`;
      const right = `${total} is entered as ${formatDifference(computed, "ns", 1)}.`;
      if (!(Math.abs(value + computed) <= tolerance)) return { errorClass: null, reason: right };
      const left = formatQuantity(2 * totalNs, "ns", 1);
      return { errorClass: "sign", reason: `The pulse would come ${left} late. ${right}` };
    },
  });
};

/** Of the parts as the candidate counts them. */
export const markUncertainty: Marker = (truth, quantity, answers, own) => {
  const delaysNs = truth.delaysNs.map((ns, n) => own.delaysNs[n] ?? ns);
  const counted = countedOf(truth.parts, delaysNs);
  const ofOwn = budgetOf(counted).uncertaintyNs;
  const computed = ofOwn >= LEAST_SHARE * truth.uncertaintyNs ? ofOwn : truth.uncertaintyNs;
  const tolerance = (quantity.tolerance / 100) * computed;
  const straight = counted.reduce((sum, { part, ns }) => sum + standardNs(part.uncertainty, ns), 0);
  const asLimits = budgetOf(counted, statedNs).uncertaintyNs;
  return markNumber({
    quantity,
    typed: answerOf(answers, "entry.uncertainty"),
    computed,
    unit: "ns",
    decimals: 2,
    tolerance,
    explain: (value) => {
      const near = (other: number) => Math.abs(value - other) <= 0.05 * other;
      const rule = `The root of the sum of squares of ${formatNumber(counted.length, 0)} standard uncertainties is ${formatQuantity(computed, "ns", 2)}.`;
      if (near(straight))
        return { errorClass: "added straight", reason: `Independent uncertainties add as squares. ${rule}` };
      if (near(asLimits))
        return { errorClass: "limits for standard", reason: `Limits are divided by the root of 3 first. ${rule}` };
      if (near(2 * computed)) return { errorClass: "expanded for standard", reason: `This is twice it. ${rule}` };
      return { errorClass: null, reason: rule };
    },
  });
};

/** Below it hardly a part counts, and there is nothing to follow. */
const LEAST_SHARE = 0.2;
