import { utcOf } from "@/lib/gnss/sky/receiverLog";
import type { Random } from "@/lib/numeric/random";
import { guessAnswers } from "../guessAnswers";
import type { Difficulty, Trial } from "../kind";
import { buildWithoutFiles } from "./buildCase";
import type { LostDecibelsTruth } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { LostDecibelsParameters } from "./parameters";
import { answersFor, logOf, readCase } from "./solve";

/** The files are not looked at: they say what the public case says. */
export const trial: Trial<LostDecibelsParameters, LostDecibelsTruth> = {
  whole: false,
  build: buildWithoutFiles,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read({ publicCase }, _plan, random) {
    const log = logOf(publicCase);
    const right = readCase(publicCase);
    const { cause, readings } = right;
    const sector = cause === "blockage";
    const off = (deviation: number) => deviation * random.gaussian();
    return answersFor(log, {
      ...right,
      readings: readings && [
        moved(random, readings[0] + (cause === "water" ? (readings[1] - readings[0]) * off(0.025) : 0), log.readings),
        moved(random, readings[1], log.readings),
      ],
      fromDeg: sector ? right.fromDeg + off(2) : right.fromDeg,
      toDeg: sector ? right.toDeg + off(2) : right.toDeg,
      depthDb: cause === "nothing" ? 0 : right.depthDb + off(0.2),
      highDbHz: right.highDbHz + off(0.05),
      lowDbHz: right.lowDbHz + off(0.05),
    });
  },
  guess(publicCase, _plan, random) {
    const log = logOf(publicCase);
    const anyTime = (own: Random) => utcOf(log, own.integer(0, log.readings - 1));
    return guessAnswers(
      publicCase.sections,
      {
        "fault.start": anyTime,
        "fault.stop": anyTime,
        "fault.azimuthFrom": (own) => (own.uniform() < 0.5 ? "0" : String(own.integer(0, 360))),
        "fault.azimuthTo": (own) => (own.uniform() < 0.5 ? "360" : String(own.integer(0, 360))),
        "fault.depth": [3, 12],
        "pattern.high": [44, 52],
        "pattern.low": [34, 44],
      },
      random,
    );
  },
  difficulty: ({ truth }) => difficultyOf(truth),
};

/** A cursor on a plot of hours stands one reading beside now and then. */
function moved(random: Random, reading: number, readings: number): number {
  const beside = random.uniform() < 0.2 ? random.pick([-1, 1]) : 0;
  return Math.min(readings - 1, Math.max(0, Math.round(reading + beside)));
}

function difficultyOf({ fault, log, highDbHz, lowDbHz }: LostDecibelsTruth): Difficulty[] {
  const touched = fault ? (fault.readings[1] - fault.readings[0] + 1) / log.readings : 0;
  return [
    { label: "C/N0 by elevation, high over low", unit: "dB", value: highDbHz - lowDbHz, from: 2, to: 14 },
    { label: "Depth of the fall", unit: "dB", value: fault?.depthDb ?? 0, from: 0, to: 15 },
    { label: "Share of the log that is touched", unit: "%", value: 100 * touched, from: 0, to: 86 },
  ];
}
