import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import type { Answers, MarkedRow } from "../kind";
import { markChoice } from "../markChoice";
import type { Finding } from "../markNumber";
import type { FalseLockTruth, ListedSatellite } from "./drawScene";
import type { Verdict } from "./quantities";

/** One row for each satellite of the sky plot. */
export const markVerdicts = (truth: FalseLockTruth, quantity: AskedQuantity, answers: Answers): MarkedRow[] =>
  truth.listed.map((satellite) =>
    markChoice({
      quantity,
      subject: `PRN ${satellite.prn}`,
      typed: answerOf(answers, `verdicts.prn${satellite.prn}`),
      right: [satellite.verdict],
      explain: (typed) => explain(truth, satellite, typed as Verdict),
    }),
  );

function explain(truth: FalseLockTruth, satellite: ListedSatellite, typed: Verdict): Finding {
  const name = `PRN ${satellite.prn}`;
  if (satellite.verdict === "genuine")
    return { errorClass: "genuine satellite refused", reason: genuineReason(truth, satellite) };
  const borrowed = `every peak in its search stands at the Doppler of PRN ${truth.parentPrn} plus or minus whole kHz`;
  if (typed === "genuine") {
    return { errorClass: "false satellite accepted", reason: `${name} is not in the capture: ${borrowed}.` };
  }
  if (satellite.verdict === "cross-correlation") {
    return {
      errorClass: "lock not explained",
      reason: `${name} itself is not there, but the receiver reports it as tracked: its lock is on the code of PRN ${truth.parentPrn}.`,
    };
  }
  return {
    errorClass: "no lock to explain",
    reason: `${name} is not in the capture and not reported as tracked, so there is no lock on another code.`,
  };
}

function genuineReason({ scene, parentPrn }: FalseLockTruth, { prn }: ListedSatellite): string {
  const signal = scene.satellites.find((satellite) => satellite.prn === prn);
  if (!signal || prn === parentPrn) return `PRN ${prn} is in the capture, the strongest of all.`;
  const level = formatQuantity(signal.cn0DbHz, "dB-Hz", 1);
  const doppler = formatQuantity(signal.dopplerHz, "Hz", 0);
  return `PRN ${prn} is in the capture at ${level} and ${doppler}, not a whole number of kHz from PRN ${parentPrn}.`;
}
