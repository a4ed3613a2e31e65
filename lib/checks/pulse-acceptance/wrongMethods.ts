import type { WrongMethod } from "../kind";
import type { PulseAcceptanceTruth } from "./drawCase";
import { maxWithoutMeanNs } from "./mistakes";
import type { PulseAcceptanceParameters } from "./parameters";
import { solve, type Steps } from "./solve";

type Wrong = WrongMethod<PulseAcceptanceParameters, PulseAcceptanceTruth>;

const wrong = (label: string, misses: Wrong["misses"], step: Partial<Steps>): Wrong => ({
  label,
  misses,
  solve: (built) => solve(built, step),
});

/** Typical wrong ways; each differs from the right one in the named step alone. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "mean-removed": wrong("The mean taken off before max|TE|", ["maxTe"], {
    figures: (figures, series) => ({ ...figures, maxTeNs: maxWithoutMeanNs(series) }),
  }),
  "deviation-for-maximum": wrong("Standard deviation for the maximum", ["maxTe"], {
    figures: (figures) => ({ ...figures, maxTeNs: figures.deviationNs }),
  }),
  "cables-ignored": wrong("The counter's leads not taken off", ["mean", "maxTe"], {
    cables: () => ({ startCableNs: 0, stopCableNs: 0 }),
  }),
  "cables-turned": wrong("The counter's leads added instead of taken off", ["mean", "maxTe"], {
    cables: ({ startCableNs, stopCableNs }) => ({ startCableNs: stopCableNs, stopCableNs: startCableNs }),
  }),
  // A log without missed triggers has nothing to leave in, so that no quantity is missed in every case.
  "triggers-left-in": wrong("Missed triggers left in", [], { clean: (series) => series }),
  "whole-day-for-interval": wrong("Peak to peak of the whole day for the MTIE of an interval", ["mtieShort"], {
    figures: (figures) => ({ ...figures, mtieShortNs: figures.peakToPeakNs, mtieLongNs: figures.peakToPeakNs }),
  }),
};
