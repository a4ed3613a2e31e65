import { momentsCn0DbHz } from "@/lib/gnss/tracking/cn0Estimators";
import { decibels } from "@/lib/numeric/elementary";
import type { PublicCase, WrongMethod } from "../kind";
import type { Cn0Truth } from "./drawCase";
import { cutThroughBits, noiseAveragedInDb, PROMPT_S, residualLeftIn, type Estimate } from "./estimates";
import type { Cn0Parameters } from "./parameters";
import { answersFor, estimateOf, promptsOf, type Prompts } from "./solve";

type Wrong = WrongMethod<Cn0Parameters, Cn0Truth>;

/** Typical wrong ways; each is the right one but for the named step. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "snr-in-1-khz": {
    label: "SNR in the 1 kHz of a prompt given as C/N0: 30 dB low",
    misses: ["cn0"],
    solve: ({ publicCase }) => byChannel(publicCase, (_, { cn0DbHz }) => cn0DbHz + decibels(PROMPT_S)),
  },
  "noise-in-db": {
    label: "Noise powers averaged as decibels: the noise comes out 2.5 dB low",
    misses: ["cn0"],
    solve: ({ publicCase }) => byChannel(publicCase, noiseAveragedInDb),
  },
  "one-branch": {
    label: "Noise of one branch taken for that of I and Q: 3 dB high",
    misses: ["cn0"],
    solve: ({ publicCase }) => byChannel(publicCase, (_, { cn0DbHz }) => cn0DbHz + decibels(2)),
  },
  "bits-cut": {
    label: "Sums of 20 ms from the first prompt on, through the middle of the bits",
    misses: ["cn0"],
    solve: ({ publicCase }) => byChannel(publicCase, cutThroughBits),
  },
  "residual-left": {
    label: "Residual of the carrier left in the sums",
    misses: ["cn0"],
    solve: ({ publicCase }) => byChannel(publicCase, residualLeftIn),
  },
  moments: {
    label: "Method of moments on every channel, the weakest included",
    misses: ["cn0", "method"],
    solve: ({ publicCase }) =>
      answersFor(
        promptsOf(publicCase).map((prompts) => momentsCn0DbHz(prompts, PROMPT_S)),
        "moments",
      ),
  },
};

const byChannel = (shown: PublicCase, level: (prompts: Prompts, estimate: Estimate) => number) =>
  answersFor(promptsOf(shown).map((prompts) => level(prompts, estimateOf(prompts))));
