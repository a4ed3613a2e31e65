import { blockedShare } from "@/lib/gnss/siting/skyMask";
import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import type { SkyViewTruth } from "./drawCase";
import { pointsText } from "./pointsText";
import { QUADRANTS } from "./quantities";
import { roomsM, type Surveyed } from "./survey";
import { degreesShare, planeShare } from "./wrong-shares";

const NEAR_POINTS = 0.5; // a known wrong value, written down to half a point

export function markBlocked(
  truth: SkyViewTruth,
  quantity: AskedQuantity,
  { id, blockedPercent }: Surveyed,
  answers: Answers,
): MarkedRow {
  return markNumber({
    quantity,
    subject: `Position ${id}`,
    typed: answerOf(answers, `${id}.blocked`),
    computed: blockedPercent,
    unit: "%",
    decimals: 1,
    tolerance: quantity.tolerance,
    toleranceText: pointsText(quantity.tolerance),
    explain: (value) => explainShare(value, blockedPercent, truth, id),
  });
}

/** Judged for the quadrant named, for the worst where none was. */
export function markQuadrantBlocked(
  _: SkyViewTruth,
  quantity: AskedQuantity,
  { id, quadrantsPercent, worst }: Surveyed,
  answers: Answers,
): MarkedRow {
  const named = QUADRANTS.findIndex(({ value }) => value === answerOf(answers, `${id}.quadrant`).trim());
  const judged = named === -1 ? worst : named;
  const computed = quadrantsPercent[judged];
  return markNumber({
    quantity,
    subject: `Position ${id}, ${QUADRANTS[judged].label.toLowerCase()}`,
    typed: answerOf(answers, `${id}.quadrantBlocked`),
    computed,
    unit: "%",
    decimals: 1,
    tolerance: quantity.tolerance,
    toleranceText: pointsText(quantity.tolerance),
    explain: (value) => {
      if (isFraction(value, computed)) return FRACTION;
      if (!(Math.abs(value - 4 * computed) <= 4 * NEAR_POINTS)) return null;
      const reason = `This is the share of the quadrant's own sky. Of the whole sky it is a quarter of that, ${formatQuantity(computed, "%", 1)}.`;
      return { errorClass: "share of the quadrant", reason };
    },
  });
}

export function markRoom(
  { roof }: SkyViewTruth,
  quantity: AskedQuantity,
  { id, roomM, tightest }: Surveyed,
  answers: Answers,
): MarkedRow {
  const rooms = roomsM(
    roof.positions.find((position) => position.id === id)!,
    roof.emitters,
  );
  return markNumber({
    quantity,
    subject: `Position ${id}`,
    typed: answerOf(answers, `${id}.room`),
    computed: roomM,
    unit: "m",
    decimals: 1,
    tolerance: quantity.tolerance,
    explain: (value) => {
      const near = (other: number) => Math.abs(value - other) <= quantity.tolerance;
      if (near(-roomM))
        return { errorClass: "sign", reason: "The size agrees; the sign does not. Too near is below zero." };
      if (near(rooms[0].distanceM)) {
        const reason = `This is the distance to the ${tightest}. Take its keep-out distance off.`;
        return { errorClass: "keep-out distance not taken off", reason };
      }
      if (!rooms.slice(1).some((other) => near(other.roomM))) return null;
      return { errorClass: "another emitter", reason: `Least room is left to the ${tightest}.` };
    },
  });
}

const isFraction = (value: number, percent: number) => Math.abs(100 * value - percent) <= NEAR_POINTS;
const FRACTION: Finding = { errorClass: "fraction for per cent", reason: "The field is in per cent." };

function explainShare(
  value: number,
  computed: number,
  { roof, rules }: SkyViewTruth,
  id: Surveyed["id"],
): Finding | null {
  const { horizon } = roof.positions.find((position) => position.id === id)!;
  const percent = (maskDeg: number, zone?: typeof planeShare) => 100 * blockedShare(horizon, maskDeg, [0, 360], zone);
  const near = (other: number) => Math.abs(value - other) <= NEAR_POINTS;
  if (isFraction(value, computed)) return FRACTION;
  if (near(percent(rules.maskDeg, planeShare))) {
    const reason = "This is the area on a polar plot. Rings low down are wide on the plot and narrow in the sky.";
    return { errorClass: "area on the plot", reason };
  }
  if (near(percent(rules.maskDeg, degreesShare))) {
    const reason = "These are degrees of elevation. The sky's share goes with the sine of the elevation.";
    return { errorClass: "degrees of elevation", reason };
  }
  if (near(percent(0))) {
    const reason = `This counts the sky from the horizon up; only what is above ${formatUnderstood(rules.maskDeg, "1")}° counts.`;
    return { errorClass: "mask left out", reason };
  }
  return null;
}
