import { meanChangeDb } from "@/lib/gnss/sky/cn0Change";
import { utcOf } from "@/lib/gnss/sky/receiverLog";
import { guessAnswers } from "../guessAnswers";
import type { Difficulty, Trial } from "../kind";
import { buildWithoutFiles } from "./buildCase";
import type { JammedOrNotTruth } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { JammedOrNotParameters } from "./parameters";
import { answersFor, logOf, readCase } from "./solve";

/** The files are not looked at: they say what the public case says. */
export const trial: Trial<JammedOrNotParameters, JammedOrNotTruth> = {
  whole: false,
  build: buildWithoutFiles,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read({ publicCase }, _plan, random) {
    const log = logOf(publicCase);
    const right = readCase(publicCase);
    // A cursor on an hour of readings stands one or two beside; the minutes of the mean move with it.
    const start = Math.max(0, right.start + Math.round(1.2 * random.gaussian()));
    const atStart = meanChangeDb(log, start);
    return answersFor(log, {
      ...right,
      start,
      gainDb: right.gainDb === 0 ? 0 : right.gainDb + 0.15 * random.gaussian(),
      cn0Db: (Number.isNaN(atStart) ? right.cn0Db : atStart) + 0.1 * random.gaussian(),
    });
  },
  guess(publicCase, _plan, random) {
    const log = logOf(publicCase);
    return guessAnswers(
      publicCase.sections,
      {
        "finding.start": (own) => utcOf(log, own.integer(0, log.readings - 1)),
        "finding.gainChange": (own) => (own.uniform() < 0.3 ? "0" : (16 * own.uniform() - 9).toFixed(1)),
        "finding.cn0Change": (own) => (own.uniform() < 0.3 ? "0" : (16 * own.uniform() - 11).toFixed(1)),
      },
      random,
    );
  },
  difficulty: ({ truth }) => difficultyOf(truth),
};

function difficultyOf({ event, cn0ChangeDb, alarm, log }: JammedOrNotTruth): Difficulty[] {
  return [
    { label: "Mean change of C/N0, without its sign", unit: "dB", value: Math.abs(cn0ChangeDb), from: 0, to: 16 },
    { label: "Gain control, without its sign", unit: "dB", value: Math.abs(event.gainDb), from: 0, to: 20 },
    { label: "Alarm after the start", unit: "s", value: (alarm - event.first) * log.intervalS, from: 85, to: 405 },
  ];
}
