import { decibels } from "@/lib/numeric/elementary";
import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatNumber, formatQuantity } from "../formatQuantity";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import { parseQuantity } from "../parseQuantity";
import type { CorrelatorReadingTruth } from "./drawCase";
import { rayleighThreshold } from "./readTrace";

type Truth = CorrelatorReadingTruth;

export function markPeakRatio({ reading }: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const computed = 2 * decibels(reading.highest / reading.second);
  return markNumber({
    quantity,
    typed: answerOf(answers, "reading.peakRatio"),
    computed,
    unit: "dB",
    decimals: 1,
    tolerance: quantity.tolerance,
    explain: (value) => explainRatio(value, computed, quantity.tolerance, reading),
  });
}

function explainRatio(
  value: number,
  computed: number,
  tolerance: number,
  { highest, second, noiseMean }: Truth["reading"],
): Finding {
  const near = (other: number) => Math.abs(value - other) <= tolerance;
  const levels = `${formatNumber(highest, 2)} over ${formatNumber(second, 2)}`;
  if (near(-computed))
    return {
      errorClass: "sign",
      reason: `The size agrees; the sign does not. ${levels} is more than one, so positive in dB.`,
    };
  if (near(computed / 2)) {
    return {
      errorClass: "power formula on an amplitude",
      reason: "The trace is a magnitude, so its ratio in dB is 20 log, not 10 log.",
    };
  }
  if (near(2 * decibels(highest / noiseMean))) {
    return {
      errorClass: "noise mean for second peak",
      reason: "This is the highest cell over the noise mean, not over the second peak.",
    };
  }
  return { errorClass: null, reason: `${levels} is ${formatQuantity(computed, "dB", 1)}.` };
}

export function markNoiseMean({ reading }: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const { noiseMean, noiseMedian, noiseRms } = reading;
  const near = (value: number, other: number) => Math.abs(value - other) <= 0.015 * other;
  return markNumber({
    quantity,
    typed: answerOf(answers, "reading.noiseMean"),
    computed: noiseMean,
    unit: "1",
    decimals: 2,
    tolerance: (quantity.tolerance / 100) * noiseMean,
    explain: (value) => {
      if (near(value, noiseMedian))
        return { errorClass: "median for mean", reason: "This is the median of the cells; the mean was asked." };
      if (near(value, noiseRms))
        return { errorClass: "rms for mean", reason: "This is the root mean square of the cells; the mean was asked." };
      return null;
    },
  });
}

/** Judged from the candidate's own noise mean where there is one. */
export function markThreshold(
  { reading, falseAlarmPerCell }: Truth,
  quantity: AskedQuantity,
  answers: Answers,
): MarkedRow {
  const own = parseQuantity(answerOf(answers, "reading.noiseMean"), "1");
  const follows = "value" in own && own.value > 0;
  const noiseMean = follows ? own.value : reading.noiseMean;
  const computed = rayleighThreshold(noiseMean, falseAlarmPerCell);
  const factor = computed / noiseMean;
  return markNumber({
    quantity,
    typed: answerOf(answers, "reading.threshold"),
    computed,
    unit: "1",
    decimals: 2,
    tolerance: (quantity.tolerance / 100) * computed,
    explain: (value) => ({
      errorClass: thresholdError(value, computed, noiseMean),
      reason: `${follows ? "Your own noise mean" : "The noise mean"} of ${formatNumber(noiseMean, 2)} times ${formatNumber(factor, 3)} is ${formatNumber(computed, 2)}.`,
    }),
  });
}

/** sigma is the mean over the root of pi/2, 1.2533; the standard deviation of |R| is 0.655 sigma, 0.5227 of the mean. */
function thresholdError(value: number, computed: number, noiseMean: number): string | null {
  const near = (other: number) => Math.abs(value - other) <= 0.02 * other;
  if (near(computed * Math.sqrt(Math.PI / 2))) return "mean taken for sigma";
  if (near(computed / Math.sqrt(2))) return "factor 2 left out of the exponent";
  if (near(noiseMean * (1 + 3 * 0.5227)) || near((3 * noiseMean) / Math.sqrt(Math.PI / 2)))
    return "three sigma of a Gaussian";
  return null;
}
