import { entryValueNs, type EntrySign } from "@/lib/gnss/timing/delayBudget";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { budgetOf, delayOfPart, runOfEchoesNs, standardNs, statedNs, type CountedPart } from "./budget";
import { drawEcho, type Echoes } from "./drawEcho";
import { drawSite } from "./drawSite";
import { NOTES } from "./notes";
import type { DelayEntryParameters } from "./parameters";
import { PULSE_LEAD, wayOf, type SitePart } from "./site";
import { toleranceNs } from "./toleranceNs";

export type DelayEntryTruth = {
  parts: SitePart[];
  echoes: Echoes;
  sign: EntrySign;
  note: string;
  /** In the order of `parts`; 0 for what is not on the way. */
  delaysNs: number[];
  totalNs: number;
  entryNs: number;
  uncertaintyNs: number;
};

export type DrawnCase = { truth: DelayEntryTruth; draws: number };

/** Draws until no named wrong method lands on the right value. */
export function drawCase(seedHex: string, parameters: DelayEntryParameters): DrawnCase {
  const first = seededRandom(seedHex, "delay-entry@1/case");
  const word = parameters.sign === "either" ? first.pick(SIGNS) : parameters.sign; // before the draws, so that refusing does not move the share
  for (let draws = 1; draws <= 500; draws++) {
    const truth = drawTruth(parameters, word, seededRandom(seedHex, `delay-entry@1/draw-${draws}`));
    if (isFair(truth)) return { truth, draws };
  }
  throw new Error("delay-entry: no fair site in 500 draws");
}

const SIGNS = ["delay-is-positive", "delay-is-negative"] as const;

function drawTruth(parameters: DelayEntryParameters, sign: EntrySign, random: Random): DelayEntryTruth {
  const parts = drawSite(random, parameters);
  const echoes = drawEcho(random, parameters);
  const way = wayOf(parts);
  const runNs = runOfEchoesNs(echoes.leadNs, echoes.endNs);
  const delaysNs = parts.map((part) => (way.includes(part) ? delayOfPart(part, runNs) : 0));
  const { totalNs, uncertaintyNs } = budgetOf(countedOf(parts, delaysNs));
  const note = random.pick(NOTES[sign]);
  return { parts, echoes, sign, note, delaysNs, totalNs, entryNs: entryValueNs(totalNs, sign), uncertaintyNs };
}

/** Parts with a delay; one of 0 does not count, and neither does its uncertainty. */
export const countedOf = (parts: readonly SitePart[], delaysNs: readonly number[]): CountedPart[] =>
  parts.flatMap((part, n) => (delaysNs[n] === 0 ? [] : [{ part, ns: delaysNs[n] }]));

const CLEAR = 2.5; // tolerances that a wrong method's value lies off at least
const CLEAR_UNCERTAINTY = 1.4; // of the right one; 25 % is allowed

const isFair = (truth: DelayEntryTruth): boolean =>
  tightest(truth) >= CLEAR && wrongUncertainties(truth).every((ns) => ns >= CLEAR_UNCERTAINTY * truth.uncertaintyNs);

/** Added straight, and limits taken for standard ones. */
function wrongUncertainties({ parts, delaysNs }: DelayEntryTruth): [straightNs: number, asLimitsNs: number] {
  const counted = countedOf(parts, delaysNs);
  const straight = counted.reduce((sum, { part, ns }) => sum + standardNs(part.uncertainty, ns), 0);
  return [straight, budgetOf(counted, statedNs).uncertaintyNs];
}

/** Of the mistakes that put a part off, the one that does so least, in tolerances. */
export function tightest({ parts, echoes, delaysNs }: DelayEntryTruth): number {
  const mistakes = parts.flatMap((part, n) =>
    mistakesNs(part, delaysNs[n], echoes).map((off) => off / toleranceNs(1, delaysNs[n])),
  );
  return mistakes.reduce((least, off) => Math.min(least, off), Infinity);
}

function mistakesNs(part: SitePart, ns: number, echoes: Echoes): number[] {
  const { paper, name } = part;
  if (ns === 0) return [delayOfPart(part, 0)]; // a stray counted
  if (paper.says === "nothing") return [ns, echoes.leadNs / 2]; // not halved, the test lead left in
  if (paper.says !== "cable") return [];
  const onTheDrum =
    paper.reelM === null ? [] : [ns * (paper.reelM / paper.installedM - 1), ns * (1 - paper.velocityFactor)];
  return name === PULSE_LEAD ? [...onTheDrum, ns] : onTheDrum;
}
