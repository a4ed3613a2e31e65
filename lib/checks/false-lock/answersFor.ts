import type { Answers } from "../kind";
import { acceptedFalsePeaks, type FalseLockTruth, type ListedSatellite } from "./drawScene";
import type { Verdict } from "./quantities";
import { verdictAnswers } from "./solve";

/** All of it right but for the verdicts. */
export function answersFor(truth: FalseLockTruth, verdictOf: (satellite: ListedSatellite) => Verdict): Answers {
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
