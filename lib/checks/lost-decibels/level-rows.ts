import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { circularDifference } from "../circularDifference";
import { formatQuantity } from "../formatQuantity";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import type { LostDecibelsTruth } from "./drawCase";

type Truth = LostDecibelsTruth;

/** Both edges of what fell; of a sector the short way round, of all round and of nothing as they are written. */
export function markAzimuths({ cause, fault }: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow[] {
  const sector = fault?.sector ?? null;
  const [fromDeg, toDeg] = sector ? [sector.fromDeg, sector.toDeg] : [0, fault ? 360 : 0];
  const plain = (): Finding => ({
    errorClass: null,
    reason: {
      blockage: `Satellites fell from azimuth ${formatQuantity(fromDeg, "deg", 0)} clockwise to ${formatQuantity(toDeg, "deg", 0)}.`,
      nothing: "No azimuth fell more than its elevation explains: 0 and 0.",
      interference: ALL_ROUND,
      loss: ALL_ROUND,
      water: ALL_ROUND,
    }[cause],
  });
  const row = (field: string, label: string, computed: number, other: number): MarkedRow =>
    markNumber({
      quantity,
      label,
      typed: answerOf(answers, field),
      computed,
      unit: "deg",
      decimals: 0,
      tolerance: quantity.tolerance,
      impossible: (value) =>
        value >= -180 && value <= 360 ? null : { errorClass: null, reason: "An azimuth is from 0° to 360°." },
      difference: (value) => (sector ? circularDifference(value, computed, 360) : value - computed),
      explain: (value) =>
        sector && Math.abs(circularDifference(value, other, 360)) <= quantity.tolerance
          ? { errorClass: "edges exchanged", reason: "The sector goes clockwise from its first edge to its second." }
          : plain(),
    });
  return [
    row("fault.azimuthFrom", "From azimuth", fromDeg, toDeg),
    row("fault.azimuthTo", "Clockwise to azimuth", toDeg, fromDeg),
  ];
}

const ALL_ROUND = "Satellites fell on all sides: 0° to 360°.";

/** A fall is written with a minus by some and without by others; both say the same. */
export function markDepth({ fault }: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const computed = fault?.depthDb ?? 0;
  const gainDb = Math.abs(fault?.gainDb ?? 0);
  return markNumber({
    quantity,
    typed: answerOf(answers, "fault.depth"),
    computed,
    unit: "dB",
    decimals: 1,
    tolerance: quantity.tolerance,
    difference: (value) => Math.abs(value) - computed,
    explain: (value) =>
      gainDb > 0 && Math.abs(Math.abs(value) - gainDb) <= quantity.tolerance
        ? {
            errorClass: "gain control read for C/N0",
            reason: `The gain control moved by ${formatQuantity(gainDb, "dB", 1)}; C/N0 fell by ${formatQuantity(computed, "dB", 1)}.`,
          }
        : null,
  });
}

export const markMean = ({ allDbHz }: Truth, quantity: AskedQuantity, typed: string, computed: number): MarkedRow =>
  markNumber({
    quantity,
    typed,
    computed,
    unit: "dB-Hz",
    decimals: 1,
    tolerance: quantity.tolerance,
    explain: (value) =>
      Math.abs(value - allDbHz) <= quantity.tolerance
        ? {
            errorClass: "all elevations taken",
            reason: `${formatQuantity(allDbHz, "dB-Hz", 1)} is the mean over all elevations.`,
          }
        : null,
  });
