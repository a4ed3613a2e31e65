import { guessAnswers } from "../guessAnswers";
import type { Difficulty, Trial } from "../kind";
import { ALL_PRNS } from "../searchCapture";
import { expectedDetection } from "../search-trial/expectedDetection";
import { answersFor } from "./answersFor";
import { firstScene } from "./drawCase";
import { LEAST_DETECTION, type FalseLockTruth } from "./drawScene";
import { markAnswers } from "./markAnswers";
import type { FalseLockParameters } from "./parameters";
import { publicCase } from "./publicCase";
import { readScene } from "./readScene";
import { REFERENCE_SEARCH } from "./referenceSearch";

/** Worst pairs are drawn from -22 to -21 dB chip by chip; between whole chips the two codes may agree by up to 2 dB more. */
const FALSE_PEAK_DB = { from: -22, to: -19 } as const;

/** A search without its samples: only the cells around each peak that decides are drawn, and the highest that hold noise. */
export const falseLockTrial: Trial<FalseLockParameters, FalseLockTruth> = {
  whole: false,
  build(seedHex, plan) {
    const { truth, draws } = firstScene(seedHex, plan.parameters);
    return { truth, publicCase: publicCase(truth, plan), files: [], draws };
  },
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers, { searched: [], weakPeak: null }),
  solve: ({ truth }) => answersFor(truth, ({ verdict }) => verdict),
  read: ({ truth }, _plan, random) => readScene(truth, random),
  guess: ({ sections }, _plan, random) =>
    guessAnswers(
      sections,
      {
        "falseLock.parent": (own) => String(own.pick(ALL_PRNS)),
        "falseLock.doppler": [-REFERENCE_SEARCH.dopplerHalfWidthHz, REFERENCE_SEARCH.dopplerHalfWidthHz],
        "falseLock.cn0": [26, 36],
      },
      random,
    ),
  difficulty({ truth }) {
    const weak = truth.scene.satellites.find(({ prn }) => prn === truth.weakPrn);
    const level = truth.falsePeaks[0].levelDb;
    const bands: Difficulty[] = [
      { label: "false peak against the strong satellite", unit: "dB", value: level, ...FALSE_PEAK_DB },
    ];
    if (!weak) return bands;
    const value = expectedDetection(weak, REFERENCE_SEARCH);
    return [
      ...bands,
      { label: "chance that the weak satellite is found", unit: "1", value, from: LEAST_DETECTION, to: 1 },
    ];
  },
};
