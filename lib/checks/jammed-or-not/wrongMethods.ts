import { timeText } from "./alarmOf";
import type { WrongMethod } from "../kind";
import type { JammedOrNotTruth } from "./drawCase";
import type { JammedOrNotParameters } from "./parameters";
import type { Indication } from "./quantities";
import { answersFor, logOf, readCase, type InstrumentReading } from "./solve";

type Wrong = WrongMethod<JammedOrNotParameters, JammedOrNotTruth>;

/** A method that reads rightly but for one step, and says the same where that step does not matter. */
const reading = (label: string, change: (right: InstrumentReading) => Partial<InstrumentReading>): Wrong => ({
  label,
  misses: [],
  solve({ publicCase }) {
    const right = readCase(publicCase);
    return answersFor(logOf(publicCase), { ...right, ...change(right) });
  },
});

const TURNED: Partial<Record<Indication, Indication>> = { "gain-down": "gain-up", "gain-up": "gain-down" };

/** Typical wrong calls. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "alarm-for-start": {
    label: "Start taken from the receiver's alarm",
    misses: ["start"],
    solve({ publicCase }) {
      const right = answersFor(logOf(publicCase), readCase(publicCase));
      return { ...right, "finding.start": timeText(publicCase) };
    },
  },
  "higher-is-better": reading("C/N0 went up, so the signals are better and the clock is to blame", ({ verdict }) =>
    verdict === "deceived" ? { verdict: "faulty" } : {},
  ),
  "gain-not-looked-at": reading("All satellites fell, so jammed: gain control not looked at", ({ verdict, gainDb }) =>
    verdict === "faulty" && gainDb > 0 ? { verdict: "jammed" } : {},
  ),
  "gain-backwards": reading("Gain control read the wrong way round", ({ verdict, gainDb, indications }) => ({
    gainDb: gainDb === 0 ? 0 : -gainDb,
    verdict: gainDb > 0 ? "jammed" : verdict === "jammed" ? "faulty" : verdict,
    indications: [TURNED[indications[0]] ?? indications[0], TURNED[indications[1]] ?? indications[1]],
  })),
  "pull-for-start": reading("Start dated from where clock or position leaves", ({ verdict, pulled }) =>
    verdict === "deceived" ? { start: pulled } : {},
  ),
  "one-thing-twice": reading("One thing given as two indications", ({ pulledTwice }) =>
    pulledTwice ? { indications: pulledTwice } : {},
  ),
};
