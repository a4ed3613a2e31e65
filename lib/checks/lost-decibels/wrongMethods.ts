import { bandMeans, directionAt, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";
import type { WrongMethod } from "../kind";
import type { LostDecibelsTruth } from "./drawCase";
import type { LostDecibelsParameters } from "./parameters";
import type { Cause } from "./quantities";
import { answersFor, logOf, readCase, type LogReading } from "./solve";

type Wrong = WrongMethod<LostDecibelsParameters, LostDecibelsTruth>;

/** A method that reads the log rightly but for one step, and says the same where that step does not matter. */
const reading = (
  label: string,
  misses: readonly string[],
  change: (right: LogReading, log: ReceiverLog) => Partial<LogReading>,
): Wrong => ({
  label,
  misses,
  solve({ publicCase }) {
    const log = logOf(publicCase);
    const right = readCase(publicCase);
    return answersFor(log, { ...right, ...change(right, log) });
  },
});

const calledInstead =
  (instead: Partial<Record<Cause, Cause>>) =>
  ({ cause }: LogReading) => ({
    cause: instead[cause] ?? cause,
  });

/** Typical wrong readings. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "all-elevations": reading("Mean C/N0 over all elevations for that above 60°", ["high"], ({ readings }, log) => {
    const bands = bandMeans(log, readings).filter((band) => band.readings > 0);
    const all = bands.reduce((sum, band) => sum + band.readings, 0);
    return { highDbHz: bands.reduce((sum, band) => sum + band.meanDbHz * band.readings, 0) / all };
  }),
  "elevation-as-blockage": reading("A satellite that sets read as blocked", [], ({ cause }, log) =>
    cause === "nothing" ? { cause: "blockage", ...deepestSetting(log) } : {},
  ),
  "bad-antenna": reading(
    "All satellites fall, so the antenna is bad: gain control not looked at",
    [],
    calledInstead({ interference: "loss" }),
  ),
  "gain-backwards": reading(
    "Gain control read the wrong way round",
    [],
    calledInstead({ interference: "loss", loss: "interference", water: "interference" }),
  ),
  "gain-for-depth": reading("Depth read off the gain control", [], ({ cause, gainDb }) =>
    cause === "nothing" ? {} : { depthDb: Math.abs(gainDb) },
  ),
  "plain-start": reading("A slow fall dated from where it is plain", [], ({ cause, readings }) =>
    cause === "water" && readings ? { readings: [Math.round((readings[0] + readings[1]) / 2), readings[1]] } : {},
  ),
};

/** The pass that loses most from its best reading on, with the azimuths it goes through meanwhile. */
function deepestSetting(log: ReceiverLog): Partial<LogReading> {
  let deepest: Partial<LogReading> & { depthDb: number } = { depthDb: 0 };
  for (const pass of log.passes) {
    const levels = pass.cn0DbHz.map((cn0) => cn0 ?? 0);
    const best = levels.reduce((found, level, at) => (level > levels[found] ? at : found), 0);
    const depthDb = levels[best] - levels[levels.length - 1];
    if (!(depthDb > deepest.depthDb)) continue;
    const readings = [pass.first + best, pass.first + levels.length - 1] as const;
    const [from, to] = readings.map((one) => directionAt(pass, log.trackEvery, one).azimuthDeg);
    deepest = { depthDb, readings, fromDeg: from, toDeg: to };
  }
  return deepest;
}
