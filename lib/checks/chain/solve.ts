import type { Answers, PublicCase } from "../kind";
import { figuresOf, type Figures } from "./figures";
import { bestChain } from "./possibleChains";
import { siteIn } from "./publicCase";
import type { Part } from "./site";

/** The right method, from site and parts alone: of all chains the one with most left on its tightest limit. */
export function solve(publicCase: PublicCase): Answers {
  const site = siteIn(publicCase);
  const chain = bestChain(site)!;
  return answersFor(chain, figuresOf(chain, site));
}

/** As somebody writes it down. */
export function answersFor(chain: readonly Part[], figures: Figures): Answers {
  const { gainDb, noiseFigureDb, delayNs, amplifiers } = figures;
  const [first] = amplifiers;
  return Object.fromEntries([
    ...chain.map(({ id }, n) => [`chain.${n + 1}.part`, id]),
    ["figures.gain", `${gainDb.toFixed(1)} dB`],
    ["figures.noise", `${noiseFigureDb.toFixed(1)} dB`],
    ["figures.headroom", `${first.headroomDb.toFixed(1)} dB`],
    ["figures.delay", `${delayNs.toFixed(0)} ns`],
    ["figures.volts", first.volts === null ? "" : `${first.volts.toFixed(2)} V`],
  ]);
}
