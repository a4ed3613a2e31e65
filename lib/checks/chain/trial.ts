import type { Random } from "@/lib/numeric/random";
import { guessAnswers } from "../guessAnswers";
import type { Answers, BuiltCase, Difficulty, PublicCase, Trial } from "../kind";
import { buildCase } from "./buildCase";
import type { ChainTruth } from "./drawCase";
import { figuresOf, type Figures } from "./figures";
import { feedFault, isSupplied, leastMarginDb, MARGIN_DB } from "./limits";
import { markAnswers } from "./markAnswers";
import type { ChainParameters } from "./parameters";
import { possibleChains } from "./possibleChains";
import { siteIn } from "./publicCase";
import { runLossDb, type Part } from "./site";
import { answersFor } from "./solve";

export const trial: Trial<ChainParameters, ChainTruth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read: ({ publicCase }, _plan, random) => read(publicCase, random),
  guess: ({ sections, data }, _plan, random) => {
    const figures = sections.filter(({ id }) => id !== "chain");
    return { ...guessAnswers(figures, GUESSES, random), ...guessedChain(data.parts as Part[], random) };
  },
  difficulty,
};

/* Of figures worked out on paper or with a pocket calculator, terms rounded on the way. */
const SIGMA_DB = 0.05;
const SIGMA_DELAY = 0.002;
const SIGMA_V = 0.008;

/** Tries chains in no order until one keeps every limit by figures of one's own; never looks for the best. */
function read(publicCase: PublicCase, random: Random): Answers {
  const site = siteIn(publicCase);
  for (const chain of random.shuffle(possibleChains(site))) {
    const figures = workedOut(figuresOf(chain, site), random);
    if (!feedFault(chain, figures) && isSupplied(figures, site) && leastMarginDb(figures, site) >= MARGIN_DB)
      return answersFor(chain, figures);
  }
  return {};
}

const workedOut = (figures: Figures, random: Random): Figures => ({
  ...figures,
  gainDb: figures.gainDb + SIGMA_DB * random.gaussian(),
  noiseFigureDb: figures.noiseFigureDb + SIGMA_DB * random.gaussian(),
  delayNs: figures.delayNs * (1 + SIGMA_DELAY * random.gaussian()),
  amplifiers: figures.amplifiers.map((one) => ({
    ...one,
    headroomDb: one.headroomDb + SIGMA_DB * random.gaussian(),
    volts: one.volts === null ? null : one.volts + SIGMA_V * random.gaussian(),
  })),
});

/** In the order that everybody of the trade knows, parts drawn evenly. */
function guessedChain(parts: readonly Part[], random: Random): Answers {
  const one = (kind: Part["kind"]) => {
    const found = parts.filter((part) => part.kind === kind);
    return found.length === 0 ? [] : [random.pick(found).id];
  };
  const chain = [...one("amplifier"), ...one("cable"), ...one("arrester"), ...one("splitter")];
  return Object.fromEntries(chain.map((id, n) => [`chain.${n + 1}.part`, id]));
}

const GUESSES = {
  "figures.gain": [15, 35],
  "figures.noise": [1, 4],
  "figures.headroom": [0, 20],
  "figures.delay": [50, 500],
  "figures.volts": [3, 5],
} as const;

function difficulty({ truth }: BuiltCase<ChainTruth>): Difficulty[] {
  const { site, best, goodChains, possibleChains: possible } = truth;
  const cable = best.find((part) => part.kind === "cable")!;
  return [
    { label: "Chains that keep every limit", unit: "%", value: (100 * goodChains) / possible, from: 0.05, to: 5 },
    {
      label: "Most that can be left on the tightest limit",
      unit: "dB",
      value: leastMarginDb(figuresOf(best, site), site),
      from: 1.3,
      to: 5,
    },
    { label: "Loss of the run", unit: "dB", value: runLossDb(cable, site.runM), from: 1.5, to: 23 },
  ];
}
