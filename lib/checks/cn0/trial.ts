import { DATA_BIT_MS } from "@/lib/gnss/constants";
import { turnedBack } from "@/lib/gnss/tracking/bitSums";
import type { Random } from "@/lib/numeric/random";
import { guessAnswers } from "../guessAnswers";
import type { Answers, Trial } from "../kind";
import { buildCase } from "./buildCase";
import { LEAST_APART_DB, type Cn0Truth } from "./drawCase";
import { PROMPTS } from "./drawPrompts";
import { narrowWide, PROMPT_S } from "./estimates";
import { markAnswers } from "./markAnswers";
import type { Cn0Parameters } from "./parameters";
import { answersFor, estimateOf, promptsOf, type Prompts } from "./solve";

/** A closed form: every case is whole. */
export const trial: Trial<Cn0Parameters, Cn0Truth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read: ({ publicCase }, _plan, random) =>
    inSteps(
      promptsOf(publicCase).map((prompts) => byHand(prompts, random)),
      random,
    ),
  guess: ({ sections }, _plan, random) =>
    guessAnswers(sections, Object.fromEntries([1, 2, 3, 4].map((n) => [`channels.ch${n}`, [27, 50] as const])), random),
  difficulty: ({ truth }, { parameters }) => {
    const levels = truth.channels.map(({ cn0DbHz }) => cn0DbHz).sort((a, b) => a - b);
    const gaps = levels.slice(1).map((level, n) => level - levels[n]);
    const [weakest, strongest] = [parameters.weakest, parameters.strongest];
    return [
      { label: "Weakest channel", unit: "dB-Hz", value: levels[0], from: weakest[0], to: weakest[1] },
      { label: "Strongest channel", unit: "dB-Hz", value: levels[3], from: strongest[0], to: strongest[1] },
      {
        label: "Channels nearest to each other",
        unit: "dB",
        value: Math.min(...gaps),
        from: LEAST_APART_DB - 1e-9,
        to: 8,
      },
    ];
  },
};

/** Part of the prompts left out at either end, the residual read to half a hertz, a weak bit edge now and then one off. */
function byHand(prompts: Prompts, random: Random): number {
  const { edge, residualHz, cn0DbHz } = estimateOf(prompts);
  const first = edge + DATA_BIT_MS * random.integer(0, 12);
  const last = PROMPTS - random.integer(0, 250);
  const off = cn0DbHz < 31 && random.uniform() < 0.2 ? random.pick([-1, 1]) : 0;
  const steady = turnedBack(prompts, Math.round(2 * residualHz) / 2, PROMPT_S);
  return narrowWide(steady.subarray(0, 2 * last), Math.max(0, first + off));
}

/** Most people write tenths, some halves. */
function inSteps(levelsDbHz: readonly number[], random: Random): Answers {
  const perDb = random.uniform() < 0.7 ? 10 : 2;
  return answersFor(
    levelsDbHz.map((level) => Math.round(level * perDb) / perDb),
    random.pick(["narrow-wide", "bit-sums"] as const),
  );
}
