import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import { parseQuantity } from "../parseQuantity";
import { otherType, type StandOffTruth } from "./drawCase";
import { Q_OF } from "./interference-types";
import { effectiveOf, interferenceDbm, jsDb, type StandOffSite } from "./standOffOf";
import { voltageEffective } from "./voltageRatio";

const FARTHEST_DBM = 300; // beyond it no level of anything

/** Level of the interference; a difference of two levels in dBm is in dB. */
export function markReceived(
  { site, receivedDbm }: StandOffTruth,
  quantity: AskedQuantity,
  answers: Answers,
): MarkedRow {
  const { tolerance } = quantity;
  return markNumber({
    quantity,
    typed: answerOf(answers, "interference.received"),
    computed: receivedDbm,
    unit: "dBm",
    decimals: 1,
    tolerance,
    toleranceText: `±${formatUnderstood(tolerance, "dB")}`,
    explain: (value) => explainReceived(value, site, receivedDbm, tolerance),
  });
}

function explainReceived(value: number, site: StandOffSite, computed: number, tolerance: number): Finding | null {
  const near = (other: number) => Math.abs(value - other) <= tolerance;
  if (near(interferenceDbm({ ...site, antennaGainDb: 0 }))) {
    const gain = formatUnderstood(site.antennaGainDb, "dB");
    return {
      errorClass: "antenna gain forgotten",
      reason: `The antenna has ${gain} towards the interferer; your value leaves that out.`,
    };
  }
  if (near(interferenceDbm({ ...site, antennaGainDb: -site.antennaGainDb }))) {
    return { errorClass: "sign of the antenna gain", reason: "A gain below 0\u00a0dB makes the interference weaker." };
  }
  if (near(-computed))
    return { errorClass: "sign", reason: "The size agrees; the level is below 1\u00a0mW, so negative." };
  if (near(interferenceDbm({ ...site, exponent: 2 }))) {
    return {
      errorClass: "free space for the path given",
      reason: `Free space has the exponent 2; this path has ${site.exponent}.`,
    };
  }
  return null;
}

/** One row a satellite, from the candidate's own level of the interference where there is one. */
export function markEffective(truth: StandOffTruth, quantity: AskedQuantity, answers: Answers): MarkedRow[] {
  const { site, type } = truth;
  const own = parseQuantity(answerOf(answers, "interference.received"), "dBm");
  const follows = "value" in own && Math.abs(own.value) <= FARTHEST_DBM;
  const receivedDbm = follows ? own.value : truth.receivedDbm;
  const { tolerance } = quantity;
  return site.satellites.map(({ prn, cn0DbHz }) => {
    const computed = effectiveOf(site, receivedDbm, Q_OF[type], cn0DbHz);
    const near = (value: number, other: number) => Math.abs(value - other) <= tolerance;
    const level = `${follows ? "Your own level" : "The level"} of ${formatQuantity(receivedDbm, "dBm", 1)}`;
    return markNumber({
      quantity,
      subject: `PRN ${prn}`,
      typed: answerOf(answers, `effective.prn${prn}`),
      computed,
      unit: "dB-Hz",
      decimals: 1,
      tolerance,
      toleranceText: `±${formatUnderstood(tolerance, "dB")}`,
      explain: (value) => ({
        errorClass: near(value, voltageEffective(site, receivedDbm, Q_OF[type], cn0DbHz))
          ? "J/S in volts"
          : near(value, effectiveOf(site, receivedDbm, Q_OF[otherType(type)], cn0DbHz))
            ? "wrong Q"
            : null,
        reason: `${level} is a J/S of ${formatQuantity(jsDb(site, receivedDbm, cn0DbHz), "dB", 1)}; with Q ${Q_OF[type]} that leaves ${formatQuantity(computed, "dB-Hz", 1)}.`,
      }),
    });
  });
}
