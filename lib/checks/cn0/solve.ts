import type { Answers, PublicCase } from "../kind";
import { estimateCn0, type Estimate } from "./estimates";

export type Prompts = readonly number[];

/** The right method, from what the technician sees. */
export const solve = (shown: PublicCase): Answers =>
  answersFor(promptsOf(shown).map((prompts) => estimateOf(prompts).cn0DbHz));

/** I and Q of each channel in turn. */
export const promptsOf = ({ data }: PublicCase): Prompts[] =>
  (data.channels as { i: number[]; q: number[] }[]).map(({ i, q }) => i.flatMap((value, n) => [value, q[n]]));

export function estimateOf(prompts: Prompts): Estimate {
  const estimate = estimateCn0(prompts);
  if (!estimate) throw new Error("cn0: a channel without a bit edge was handed out");
  return estimate;
}

/** To a tenth of a dB, as people write them; a level that could not be had is left out. */
export const answersFor = (levelsDbHz: readonly number[], method = "narrow-wide"): Answers => ({
  ...Object.fromEntries(
    levelsDbHz.map((level, n) => [`channels.ch${n + 1}`, Number.isFinite(level) ? level.toFixed(1) : ""]),
  ),
  "channels.method": method,
});
