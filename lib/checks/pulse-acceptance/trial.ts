import type { Random } from "@/lib/numeric/random";
import { guessAnswers, type Guess } from "../guessAnswers";
import type { Answers, BuiltCase, Difficulty, Trial } from "../kind";
import { buildCase } from "./buildCase";
import type { PulseAcceptanceTruth } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { PulseAcceptanceParameters } from "./parameters";
import { solve } from "./solve";

/** The release check's own people. */
export const trial: Trial<PulseAcceptanceParameters, PulseAcceptanceTruth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read: (built, _plan, random) => readBy(built, random),
  guess: (publicCase, _plan, random) => guessAnswers(publicCase.sections, GUESSES, random),
  difficulty: ({ truth }) => difficultyOf(truth),
};

const EYE_NS = 0.15; // standard deviation of a level read off a plot by cursor
const EYE_MIN = 1; // of the step's place in the sawtooth, two readings

/** Levels off by the eye, leads rounded to whole ns by some, the step's place off by some readings. */
function readBy(built: BuiltCase<PulseAcceptanceTruth>, random: Random): Answers {
  const eye = () => EYE_NS * random.gaussian();
  return solve(built, {
    figures: (figures) => ({
      ...figures,
      maxTeNs: figures.maxTeNs + eye(),
      mtieShortNs: figures.mtieShortNs + eye(),
      mtieLongNs: figures.mtieLongNs + eye(),
    }),
    stepMin: (minutes) => Math.max(0, minutes + EYE_MIN * random.gaussian()),
  });
}

/** Figures as such logs have them. */
const GUESSES: Readonly<Record<string, Guess>> = {
  "log.mean": [-100, 100],
  "log.maxTe": [20, 160],
  "log.mtieShort": [5, 80],
  "log.mtieLong": [10, 100],
  "step.time": [0, 1440],
};

function difficultyOf({ figures, limitNs, shape }: PulseAcceptanceTruth): Difficulty[] {
  const step = shape.step && Math.abs(shape.step.sizeNs) / Math.max(1, shape.sawtoothNs);
  return [
    { label: "max|TE| from its limit", unit: "ns", value: Math.abs(figures.maxTeNs - limitNs), from: 3, to: 110 },
    { label: "MTIE, short interval", unit: "ns", value: figures.mtieShortNs, from: 3, to: 120 },
    ...(step === null ? [] : [{ label: "Step over sawtooth", unit: "1", value: step, from: 1.5, to: 80 } as const]),
  ];
}
