import type { Random } from "@/lib/numeric/random";
import { guessAnswers, type Guess } from "../guessAnswers";
import type { Answers, BuiltCase, Difficulty, PublicCase, Trial } from "../kind";
import { buildCase } from "./buildCase";
import { tightest, type DelayEntryTruth } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { DelayEntryParameters } from "./parameters";
import { readTraces, solve } from "./solve";

/** The release check's own people. */
export const trial: Trial<DelayEntryParameters, DelayEntryTruth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read: ({ publicCase }, _plan, random) => readBy(publicCase, random),
  guess: (publicCase, _plan, random) => guessAnswers(publicCase.sections, guessesFor(publicCase), random),
  difficulty,
};

const EYE_NS = 0.5; // standard deviation of a half-way point read by eye and cursor, one point of the trace

/** Each echo off by the eye, the delay and the value to enter rounded to whole ns as many write them. */
function readBy(publicCase: PublicCase, random: Random): Answers {
  const answers = solve(publicCase, {
    read: (data) => {
      const { leadNs, endNs } = readTraces(data);
      return { leadNs: leadNs + EYE_NS * random.gaussian(), endNs: endNs + EYE_NS * random.gaussian() };
    },
  });
  const whole = (id: string) => Number(answers[id]).toFixed(0);
  return random.uniform() < 0.5 ? answers : { ...answers, "entry.value": whole("entry.value") };
}

/** Delays as parts of such a site have them, an entry of either sign. */
function guessesFor({ data }: PublicCase): Record<string, Guess> {
  const parts = data.parts as { id: string }[];
  return {
    "trace.lead": [10, 60],
    "trace.end": [60, 1000],
    ...Object.fromEntries(parts.map(({ id }) => [`parts.${id}`, [0, 200]])),
    "entry.total": [100, 1200],
    "entry.value": [-1200, 1200],
    "entry.uncertainty": [1, 10],
  };
}

function difficulty({ truth }: BuiltCase<DelayEntryTruth>): Difficulty[] {
  const { totalNs, uncertaintyNs } = truth;
  return [
    { label: "Total delay", unit: "ns", value: totalNs, from: 100, to: 1800 },
    { label: "Smallest mistake over its tolerance", unit: "1", value: tightest(truth), from: 2, to: 1000 },
    { label: "Standard uncertainty", unit: "ns", value: uncertaintyNs, from: 1, to: 20 },
  ];
}
