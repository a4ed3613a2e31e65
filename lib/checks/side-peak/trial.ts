import { chipsToMetres } from "@/lib/gnss/constants";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { guessAnswers } from "../guessAnswers";
import type { Answers, PublicCase, Trial } from "../kind";
import { buildCase } from "./buildCase";
import { STEP_CHIPS, type SidePeakTruth } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { SidePeakParameters } from "./parameters";
import { levelDb, type Peak, type Peaks } from "./readPeaks";
import { answersFor, peaksOf } from "./solve";

/** A closed form: every case is whole. */
export const trial: Trial<SidePeakParameters, SidePeakTruth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read: ({ publicCase }, _plan, random) => byEye(publicCase, random),
  guess: ({ sections, data }, _plan, random) => {
    const tracked = data.trackedLagChips as number;
    // Somebody who knows that a BOC(1,1) has side peaks about half a chip off, and which way the sign goes.
    const offset = random.pick([-0.5, 0, 0.5]);
    const ranges = {
      "lock.lag": () => (tracked - offset - (offset && between(random, -0.07, 0.07))).toFixed(2),
      "lock.bias": () => chipsToMetres(offset).toFixed(0),
      "earlier.bias": [-175, -140],
      "earlier.level": [3, 9],
      "later.bias": [140, 175],
      "later.level": [3, 9],
    } as const;
    return guessAnswers(sections, ranges, random);
  },
  difficulty: ({ truth }, { parameters }) => {
    const levels = (["earlier", "later"] as const).map((side) => levelDb(truth.peaks, side));
    return [
      {
        label: "C/N0 times averaging time",
        unit: "dB",
        value: truth.cn0TDb,
        from: parameters.cn0T[0],
        to: parameters.cn0T[1],
      },
      { label: "Higher side peak under the main peak", unit: "dB", value: Math.min(...levels), from: 1.5, to: 11.1 },
      { label: "Lower side peak under the main peak", unit: "dB", value: Math.max(...levels), from: 1.5, to: 11.1 },
    ];
  },
};

/** The cursor stops a point or two beside the top more often than on it, and a level is read there. */
function byEye(shown: PublicCase, random: Random): Answers {
  const peaks = peaksOf(shown);
  const trace = shown.data.trace as number[];
  const fromChips = shown.data.fromChips as number;
  const nearTop = ({ lagChips }: Peak): Peak => {
    const point = Math.round((lagChips - fromChips) / STEP_CHIPS) + random.pick([-2, -1, -1, 0, 0, 0, 1, 1, 2]);
    return { lagChips: fromChips + point * STEP_CHIPS, level: trace[point] };
  };
  const read: Peaks = { main: nearTop(peaks.main), earlier: nearTop(peaks.earlier), later: nearTop(peaks.later) };
  const answers = answersFor(shown, read);
  const whole = (field: string) => Number(answers[field]).toFixed(0);
  // Half of the people write whole metres.
  if (random.uniform() < 0.5) return answers;
  return {
    ...answers,
    "lock.bias": whole("lock.bias"),
    "earlier.bias": whole("earlier.bias"),
    "later.bias": whole("later.bias"),
  };
}
