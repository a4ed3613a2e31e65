import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { decibels } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { circularDifference } from "../circularDifference";
import { guessAnswers, type Guess } from "../guessAnswers";
import type { Answers, BuiltCase, Difficulty, PublicCase, Trial } from "../kind";
import { buildCase } from "./buildCase";
import type { CorrelatorReadingTruth } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { CorrelatorReadingParameters } from "./parameters";
import { rayleighThreshold, readTrace, STEP_CHIPS } from "./readTrace";
import { convertedLag } from "./solve";

/** The release check's own people. */
export const trial: Trial<CorrelatorReadingParameters, CorrelatorReadingTruth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read: ({ publicCase }, _plan, random) => readBy(publicCase, random),
  guess: (publicCase, _plan, random) => guessAnswers(publicCase.sections, GUESSES, random),
  difficulty,
};

const EYE = 0.003; // of the highest cell: a pixel of a plot some 200 high, and what a person makes of it
const EVERY = 4; // cells of the table or file that go into a noise mean

/** Cells compared by eye, the noise mean from a part of them, figures as people write them. */
function readBy({ data }: PublicCase, random: Random): Answers {
  const trace = data.trace as number[];
  const falseAlarm = data.falseAlarmPerCell as number;
  const top = trace.reduce((most, value) => Math.max(most, value), 0);
  const seen = readTrace(
    trace.map((value) => value + EYE * top * random.gaussian()),
    falseAlarm,
  );
  const cell = Math.round(seen.highestLagChips / STEP_CHIPS);
  const noiseMean = Number(someNoiseMean(trace, cell, random.integer(0, EVERY - 1)).toPrecision(3));
  const threshold = rayleighThreshold(noiseMean, falseAlarm);
  return {
    "reading.detection": seen.highest > threshold ? "yes" : "no",
    "reading.lag": seen.highestLagChips.toFixed(2),
    ...convertedLag(Number(seen.highestLagChips.toFixed(2))),
    "reading.peakRatio": (2 * decibels(seen.highest / seen.second)).toFixed(1),
    "reading.noiseMean": String(noiseMean),
    "reading.threshold": String(Number(threshold.toPrecision(3))),
  };
}

/** Every fourth cell that lies more than a chip from the highest. */
function someNoiseMean(trace: readonly number[], highestCell: number, from: number): number {
  const away = (cell: number) =>
    Math.abs(circularDifference(cell * STEP_CHIPS, highestCell * STEP_CHIPS, CA_LENGTH_CHIPS)) > 1;
  const cells = trace.filter((_, cell) => cell % EVERY === from && away(cell));
  return cells.reduce((sum, value) => sum + value, 0) / cells.length;
}

/** Figures as such traces have them, in counts. */
const GUESSES: Readonly<Record<string, Guess>> = {
  "reading.lag": [0, 1023],
  "reading.lagTime": [0, 1000],
  "reading.lagLength": [0, 299_792],
  "reading.peakRatio": [0, 14],
  "reading.noiseMean": [2, 25],
  "reading.threshold": [10, 105],
};

function difficulty({ truth }: BuiltCase<CorrelatorReadingTruth>): Difficulty[] {
  const { signal, reading, lagChips } = truth;
  const over = signal ? reading.highest / reading.threshold : reading.threshold / reading.highest;
  const off = Math.abs(circularDifference(reading.highestLagChips, lagChips, CA_LENGTH_CHIPS));
  return [
    { label: "Highest cell from the delay", unit: "chip", value: off, from: 0, to: 0.15 },
    { label: "Highest cell and threshold, larger over smaller", unit: "1", value: over, from: 1.08, to: 20 },
  ];
}
