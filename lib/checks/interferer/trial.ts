import type { Random } from "@/lib/numeric/random";
import { guessAnswers } from "../guessAnswers";
import type { Trial } from "../kind";
import type { CaptureReading } from "./analyse";
import { buildCase } from "./buildCase";
import type { InterfererTruth } from "./drawCase";
import { fullScaleDb, MHZ } from "./drawScene";
import { markAnswers } from "./markAnswers";
import type { InterfererParameters } from "./parameters";
import { answersFor, readingOf } from "./solve";

/** How the release check tries the kind. */
export const trial: Trial<InterfererParameters, InterfererTruth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read: ({ files }, _plan, random) => answersFor(byEye(readingOf(files), random)),
  guess: ({ sections }, _plan, random) => guessAnswers(sections, GUESSES, random),
  difficulty: ({ truth: { scene } }) => [
    {
      label: "Noise floor in 1 MHz against full scale",
      unit: "dB",
      value: fullScaleDb(scene.floorPerHz * MHZ),
      from: -52,
      to: -20,
    },
    ...(scene.interferer
      ? [{ label: "Level over the floor in 1 MHz", unit: "dB" as const, value: scene.figures.levelDb, from: 9, to: 36 }]
      : []),
  ],
};

/** Cursor and eye on a spectrum: edges to some hundredths of the width, levels to some tenths of a dB. */
function byEye(reading: CaptureReading, random: Random): CaptureReading {
  const wide = reading.bandwidthHz;
  const isThere = reading.class !== "nothing";
  return {
    ...reading,
    centreHz: isThere ? reading.centreHz + Math.max(1500, 0.004 * wide) * random.gaussian() : 0,
    bandwidthHz: wide * (1 + 0.03 * random.gaussian()),
    periodS: reading.periodS * (1 + 0.01 * random.gaussian()),
    levelDb: isThere ? reading.levelDb + 0.3 * random.gaussian() : 0,
    floorDb: reading.floorDb + 0.2 * random.gaussian(),
    ownLineDb: reading.ownLineDb + 0.3 * random.gaussian(),
  };
}

/** Every third field is left at 0, as the form allows. */
const orZero = (from: number, to: number) => (random: Random) =>
  random.uniform() < 1 / 3 ? "0" : (from + random.uniform() * (to - from)).toPrecision(3);

const GUESSES = {
  "interference.centre": orZero(-1500, 1500),
  "interference.bandwidth": orZero(20, 2500),
  "interference.period": orZero(5, 1000),
  "interference.level": orZero(10, 35),
  "receiver.floor": [-50, -25] as const,
  "receiver.ownLine": [-5, 10] as const,
};
