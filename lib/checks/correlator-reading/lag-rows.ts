import { CA_LENGTH_CHIPS, chipsToMetres, chipsToSeconds } from "@/lib/gnss/constants";
import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { circularDifference } from "../circularDifference";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import { parseQuantity } from "../parseQuantity";
import type { CorrelatorReadingTruth } from "./drawCase";
import { CELLS, CELLS_PER_CHIP } from "./readTrace";

type Truth = CorrelatorReadingTruth;

/** The lag in chip, the short way round the code. */
export const markLag = (truth: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow =>
  markNumber({
    quantity,
    typed: answerOf(answers, "reading.lag"),
    computed: truth.lagChips,
    unit: "chip",
    decimals: 2,
    tolerance: quantity.tolerance,
    difference: (value, computed) => circularDifference(value, computed, CA_LENGTH_CHIPS),
    impossible: (value) => outOfCode(truth, value),
    explain: (value) => explainLag(truth, value, quantity.tolerance),
  });

/** Half a chip beyond either end is still taken round; more is no lag of this code. */
function outOfCode({ lagChips }: Truth, value: number): Finding | null {
  if (value >= -0.5 && value <= CA_LENGTH_CHIPS + 0.5) return null;
  if (Math.abs(value - lagChips * CELLS_PER_CHIP) <= CELLS_PER_CHIP) {
    return { errorClass: "cells for chips", reason: "Cells were counted, not chips. There are eight cells to a chip." };
  }
  return { errorClass: null, reason: "A code is 1\u2009023 chips long, so a lag runs from 0 to 1\u2009022.875 chip." };
}

function explainLag({ lagChips, trace, reading }: Truth, value: number, tolerance: number): Finding | null {
  const near = (other: number) => Math.abs(circularDifference(value, other, CA_LENGTH_CHIPS)) <= tolerance;
  if (near(CA_LENGTH_CHIPS - lagChips)) {
    return {
      errorClass: "mirrored delay (1 023 - x)",
      reason: "This is 1\u2009023 chip minus the lag: the axis was read backwards.",
    };
  }
  const there = trace[(Math.round(value * CELLS_PER_CHIP) + CELLS) % CELLS];
  return {
    errorClass: there > 2 * reading.noiseMean ? "side lobe read as peak" : null,
    reason: `At ${formatUnderstood(value, "chip")} the trace reads ${formatNumber(there, 2)}; its highest cell reads ${formatNumber(reading.highest, 2)}.`,
  };
}

/** The lag in us, from the candidate's own chips where there are any. */
export function markLagTime(truth: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const base = baseLag(truth, answers);
  const computed = chipsToSeconds(base.chips) * 1e6;
  return markNumber({
    ...relativeLine(quantity, computed, 0.01, chipsToSeconds(base.looseChips) * 1e6),
    typed: answerOf(answers, "reading.lagTime"),
    unit: "us",
    decimals: 2,
    explain: (value) => ({
      errorClass: sameWithin(value, base.chips, 0.003) ? "chips for microseconds" : mirrored(value, computed, 1000),
      reason: `${base.words} lasts ${formatQuantity(computed, "us", 2)}: a chip lasts 1/1.023\u00a0µs.`,
    }),
  });
}

/** The lag in m, likewise. */
export function markLagLength(truth: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const base = baseLag(truth, answers);
  const computed = chipsToMetres(base.chips);
  return markNumber({
    ...relativeLine(quantity, computed, 3, chipsToMetres(base.looseChips)),
    typed: answerOf(answers, "reading.lagLength"),
    unit: "m",
    decimals: 0,
    explain: (value) => ({
      errorClass: sameWithin(value, base.chips * 300, 0.003)
        ? "300 m chip"
        : mirrored(value, computed, chipsToMetres(CA_LENGTH_CHIPS)),
      reason: `${base.words} is ${formatQuantity(computed, "m", 0)} long: a chip is 293.05\u00a0m, the speed of light over 1.023\u00a0MHz.`,
    }),
  });
}

/** Follow-through: an own lag that can be read is the base, however wrong; else the true one with the lag's tolerance added. */
function baseLag(truth: Truth, answers: Answers): { chips: number; looseChips: number; words: string } {
  const own = parseQuantity(answerOf(answers, "reading.lag"), "chip");
  if ("value" in own && Math.abs(own.value) < CELLS) {
    return { chips: own.value, looseChips: 0, words: `Your own lag of ${formatUnderstood(own.value, "chip")}` };
  }
  return { chips: truth.lagChips, looseChips: 0.2, words: `The lag of ${formatQuantity(truth.lagChips, "chip", 2)}` };
}

function relativeLine(quantity: AskedQuantity, computed: number, least: number, loose: number) {
  const tolerance = Math.max((quantity.tolerance / 100) * Math.abs(computed), least) + loose;
  return { quantity, computed, tolerance };
}

const sameWithin = (value: number, other: number, relative: number) =>
  Math.abs(value - other) <= relative * Math.abs(other);

const mirrored = (value: number, computed: number, wholeCode: number) =>
  sameWithin(value, wholeCode - computed, 0.01) ? "mirrored delay (1 023 - x)" : null;
