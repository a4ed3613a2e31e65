import type { SceneSatellite } from "@/lib/gnss/scene";
import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import { markWord } from "../markWord";
import { parsePrn } from "../parsePrn";
import { parseQuantity } from "../parseQuantity";
import { wrongSign } from "../wrongSign";
import { acceptedFalsePeaks, type FalseLockTruth } from "./drawScene";
import { offWholeKilohertz } from "./offWholeKilohertz";
import { EQUAL_WITHIN_DB, type FalsePeakPlace } from "./strongestFalsePeaks";

type Truth = FalseLockTruth;

export function markParent(truth: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const typed = answerOf(answers, "falseLock.parent");
  const reading = parsePrn(typed);
  const findingOf = (): Finding | null => {
    if ("problem" in reading) return { errorClass: null, reason: reading.problem };
    if (reading.prn === truth.parentPrn) return null;
    const level = formatQuantity(parentOf(truth).cn0DbHz, "dB-Hz", 1);
    return {
      errorClass: reading.prn === truth.victimPrn ? "victim for parent" : null,
      reason: `Only PRN ${truth.parentPrn}, at ${level}, is strong enough to be seen through another code.`,
    };
  };
  return markWord({
    quantity,
    handedIn: typed,
    understood: "prn" in reading ? `PRN ${reading.prn}` : undefined,
    computed: `PRN ${truth.parentPrn}`,
    finding: findingOf(),
  });
}

/** Against the nearest of the false peaks that count. */
export function markFalseDoppler(truth: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const typed = answerOf(answers, "falseLock.doppler");
  return markNumber({
    quantity,
    subject: `PRN ${truth.victimPrn}`,
    typed,
    computed: peakMeant(truth, typed).dopplerHz,
    unit: "Hz",
    decimals: 0,
    tolerance: quantity.tolerance,
    explain: (value) => explainDoppler(truth, value, quantity.tolerance),
  });
}

function explainDoppler(truth: Truth, value: number, tolerance: number): Finding {
  const parentHz = parentOf(truth).dopplerHz;
  const mirrored = acceptedFalsePeaks(truth).map(({ dopplerHz }) => wrongSign(value, dopplerHz, tolerance));
  if (offWholeKilohertz(value, parentHz) > tolerance) {
    const row = `${formatQuantity(parentHz, "Hz", 0)} plus or minus whole kHz`;
    const reason = `The false peaks of PRN ${truth.victimPrn} stand at the Doppler of PRN ${truth.parentPrn}, ${row}.`;
    return mirrored.find((finding) => finding !== null) ?? { errorClass: null, reason };
  }
  const lower = truth.falsePeaks.find(({ dopplerHz }) => Math.abs(dopplerHz - value) <= tolerance);
  const under = lower ? formatQuantity(truth.falsePeaks[0].levelDb - lower.levelDb, "dB", 1) : "more than 3\u00a0dB";
  return {
    errorClass: "lower false peak",
    reason: `The false peak there is ${under} under the highest; those within ${EQUAL_WITHIN_DB}\u00a0dB count.`,
  };
}

/** Against the level at the candidate's own Doppler where a false peak that counts stands there, else the highest. */
export function markFalseCn0(truth: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const peak = peakMeant(truth, answerOf(answers, "falseLock.doppler"));
  return markNumber({
    quantity,
    subject: `PRN ${truth.victimPrn}`,
    typed: answerOf(answers, "falseLock.cn0"),
    computed: peak.apparentCn0DbHz,
    unit: "dB-Hz",
    decimals: 1,
    tolerance: quantity.tolerance,
    explain: (value) => explainCn0(truth, peak, value, quantity.tolerance),
  });
}

function explainCn0(truth: Truth, peak: FalsePeakPlace, value: number, tolerance: number): Finding {
  const parent = parentOf(truth).cn0DbHz;
  const sum = `${formatQuantity(parent, "dB-Hz", 1)} of PRN ${truth.parentPrn} less ${formatQuantity(-peak.levelDb, "dB", 1)}`;
  const reason = `The two codes agree to ${formatQuantity(peak.levelDb, "dB", 1)}: ${sum} is ${formatUnderstood(Number(peak.apparentCn0DbHz.toFixed(1)), "dB-Hz")}.`;
  if (Math.abs(value - parent) <= tolerance) return { errorClass: "parent's own C/N0", reason };
  return { errorClass: Math.abs(value + 30 - peak.apparentCn0DbHz) <= tolerance ? "SNR in 1 kHz" : null, reason };
}

const parentOf = ({ scene, parentPrn }: Truth) =>
  scene.satellites.find(({ prn }) => prn === parentPrn) as SceneSatellite;

/** The nearest counting peak to what was typed; the highest when nothing can be read. */
function peakMeant(truth: Truth, typed: string): FalsePeakPlace {
  const accepted = acceptedFalsePeaks(truth);
  const reading = parseQuantity(typed, "Hz");
  if ("problem" in reading) return accepted[0];
  return accepted.reduce((a, b) =>
    Math.abs(b.dopplerHz - reading.value) < Math.abs(a.dopplerHz - reading.value) ? b : a,
  );
}
