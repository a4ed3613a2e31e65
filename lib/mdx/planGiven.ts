import { formatUnderstood } from "@/lib/checks/formatUnderstood";
import { decimalsOfGiven, stepsOf } from "@/lib/checks/formula/givenValues";
import { MOST_DECIMALS, MOST_STEPS, type Given } from "@/lib/checks/formula/parameters";
import type { Unit } from "@/lib/gnss/units";
import { numberValue } from "@/lib/mdx/attributeValue";
import type { OwnPart } from "@/lib/mdx/ownPart";

/** A given as written, with values that can be shown exactly; null where something is wrong with it. */
export function planGiven(part: OwnPart): Given | null {
  if (!part.requireOnly(["id", "label", "unit", "from", "to", "step"])) return null;
  const unit = part.text("unit") as Unit;
  const [from, to, step] = ["from", "to", "step"].map((name) => numberIn(part, name, unit));
  const label = part.label();
  if (from === null || to === null || step === null) return null;
  const given: Given = { id: part.text("id"), label, unit, from, to, step };
  const fault = faultOf(given);
  if (fault) part.refuse(fault.name, fault.message);
  return part.problems.length === 0 ? given : null;
}

const FARTHEST = 1e12;

function numberIn(part: OwnPart, name: string, unit: Unit): number | null {
  const written = part.value(name);
  const read = numberValue(name, { unit, from: -FARTHEST, to: FARTHEST }, written ?? null);
  if ("value" in read) return Number(read.value.toPrecision(12)) + 0; // what converting a unit left is taken off
  part.refuse(name, read.problem);
  return null;
}

function faultOf(given: Given): { name: string; message: string } | null {
  const { from, to, step, unit } = given;
  if (!(step > 0)) return { name: "step", message: "step is above zero: from one value to the next." };
  if (!(to >= from)) return { name: "to", message: "to is not below from. Exchange the two." };
  if (decimalsOfGiven(given) > MOST_DECIMALS) {
    return {
      name: "step",
      message: `Values have at most ${MOST_DECIMALS} figures behind the point. Choose a smaller unit.`,
    };
  }
  const whole = Math.floor((to - from) / step + 1e-6);
  if (whole > MOST_STEPS) {
    return {
      name: "step",
      message: `There are at most ${formatUnderstood(MOST_STEPS, "1")} values to draw from. Write a larger step.`,
    };
  }
  if (!Number.isNaN(stepsOf(given))) return null;
  const last = formatUnderstood(Number((from + whole * step).toPrecision(12)), unit);
  return {
    name: "to",
    message: `to lies on no whole step from from; the last value is ${last}. Write that, or another step.`,
  };
}
