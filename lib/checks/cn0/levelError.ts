import { momentsCn0DbHz } from "@/lib/gnss/tracking/cn0Estimators";
import { formatQuantity } from "../formatQuantity";
import type { Finding } from "../markNumber";
import type { Cn0Channel } from "./drawCase";
import { cutThroughBits, noiseAveragedInDb, PROMPT_S, residualLeftIn } from "./estimates";

const NEAR_DB = 0.25; // of what a known mistake makes of these very prompts

/** Names the mistake behind a value, by making the same mistake on the same prompts. */
export function levelError(value: number, channel: Cn0Channel, all: readonly Cn0Channel[]): Finding {
  const { cn0DbHz, prompts, estimate, edge, residualHz } = channel;
  const near = (wrong: number) => Math.abs(value - wrong) <= NEAR_DB;
  if (Math.abs(value + 30 - cn0DbHz) <= 1.5)
    return {
      errorClass: "SNR in 1 kHz for C/N0",
      reason:
        "This is the SNR in the 1\u00a0kHz of a prompt of 1\u00a0ms; C/N0 is 30\u00a0dB more, 10 log of 1\u2009000\u00a0Hz.",
    };
  if (near(cutThroughBits(prompts, estimate)))
    return {
      errorClass: "bits cut in the middle",
      reason: `Sums from the first prompt on run through the bits, which begin at ${formatQuantity(edge, "ms", 0)}.`,
    };
  if (near(residualLeftIn(prompts, estimate)))
    return {
      errorClass: "residual left in",
      reason: `The carrier turns by ${formatQuantity(residualHz, "Hz", 1)} and takes from the sums over a bit; take it out first.`,
    };
  if (near(noiseAveragedInDb(prompts, estimate)))
    return {
      errorClass: "mean of decibels",
      reason: "Noise powers were averaged as decibels, which reads 2.5\u00a0dB low.",
    };
  if (near(estimate.cn0DbHz + 3.0103))
    return {
      errorClass: "noise of one branch",
      reason: "Noise is that of I and Q together, 3\u00a0dB more than of one.",
    };
  if (near(momentsCn0DbHz(prompts, PROMPT_S)))
    return {
      errorClass: "moments of single prompts",
      reason: "The method of moments scatters by more than 2\u00a0dB here.",
    };
  const other = all.findIndex((one) => one !== channel && Math.abs(value - one.cn0DbHz) <= 0.5);
  if (other >= 0) return { errorClass: "channels exchanged", reason: `This is the C/N0 of channel ${other + 1}.` };
  const side = value > cn0DbHz ? "above" : "below";
  return {
    errorClass: null,
    reason: `Your value is ${formatQuantity(Math.abs(value - cn0DbHz), "dB", 1)} ${side} the computed one.`,
  };
}
