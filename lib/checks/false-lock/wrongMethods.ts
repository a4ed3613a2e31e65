import type { Answers, WrongMethod } from "../kind";
import { acceptedFalsePeaks, type FalseLockTruth, type ListedSatellite } from "./drawScene";
import type { FalseLockParameters } from "./parameters";
import type { Verdict } from "./quantities";
import { verdictAnswers } from "./solve";

type Wrong = WrongMethod<FalseLockParameters, FalseLockTruth>;

/** Typical wrong methods; each takes the scene as found and differs in the named step alone. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "highest-peak-wins": {
    label: "What passes the threshold is there",
    misses: ["verdict", "test"],
    solve: ({ truth }) => ({ ...answersFor(truth, () => "genuine"), "falseLock.test": "highest-peak" }),
  },
  "threshold-raised": {
    label: "Threshold raised until the false lock and every weak satellite are gone",
    misses: ["verdict", "test", "remedy"],
    solve: ({ truth }) => ({
      ...answersFor(truth, ({ reportedCn0DbHz }) => ((reportedCn0DbHz ?? 0) >= 36 ? "genuine" : "absent")),
      "falseLock.test": "threshold",
      "falseLock.remedy": "raise",
    }),
  },
  multipath: {
    label: "Called multipath",
    misses: ["test", "remedy"],
    solve: ({ truth }) => ({
      ...answersFor(truth, ({ verdict }) => verdict),
      "falseLock.test": "second-path",
      "falseLock.remedy": "antenna",
    }),
  },
  "sky-plot-alone": {
    label: "Sky plot and report believed, capture not searched",
    misses: ["falseDoppler"],
    solve: ({ truth }) => ({
      ...answersFor(truth, ({ verdict, reportedCn0DbHz }) => (reportedCn0DbHz === null ? "absent" : verdict)),
      "falseLock.doppler": "",
      "falseLock.cn0": "29",
      "falseLock.test": "mask",
    }),
  },
};

/** All of it right but for the verdicts. */
function answersFor(truth: FalseLockTruth, verdictOf: (satellite: ListedSatellite) => Verdict): Answers {
  const [peak] = acceptedFalsePeaks(truth);
  return {
    ...verdictAnswers(truth.listed.map((satellite) => ({ prn: satellite.prn, verdict: verdictOf(satellite) }))),
    "falseLock.parent": String(truth.parentPrn),
    "falseLock.doppler": peak.dopplerHz.toFixed(0),
    "falseLock.cn0": peak.apparentCn0DbHz.toFixed(1),
    "falseLock.test": "doppler-modulo",
    "falseLock.remedy": "compare",
  };
}
