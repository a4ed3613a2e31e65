import { addMonths } from "@/lib/calendar";

/** A case that a person has opened, on a day of the employer's time zone. */
export type OpenedCase = { kind: string; checkId: string; moduleId: string; day: string };
export type ExposureRule = { exposure?: number | undefined };
export type ExposedCheck = { id: string; kind: string; moduleId: string };

/** Cases of one kind that a person may open within the months. Common practice, no source. */
export const USUAL_EXPOSURE = 3;
export const EXPOSURE_MONTHS = 12;

/** Kinds whose cases are the lead's own: two checks of such a kind have nothing in common but the name. */
const OWN_KINDS: readonly string[] = ["formula", "written"];

export const exposureLimit = (rule: ExposureRule): number => rule.exposure ?? USUAL_EXPOSURE;

/**
 * Whoever sees the same kind of case too often knows the cases and not the work. A case counts from the day it was
 * opened on, until the same day of the month twelve months later.
 * @returns the first day on which one more may be opened; null when that is today
 */
export function exposedUntil(
  check: ExposedCheck,
  opened: readonly OpenedCase[],
  rule: ExposureRule,
  today: string,
): string | null {
  const family = familyOf(check);
  const counted = opened
    .filter((one) => familyOf({ ...one, id: one.checkId }) === family)
    .map(({ day }) => addMonths(day, EXPOSURE_MONTHS))
    .filter((until) => today < until)
    .sort();
  return counted[counted.length - exposureLimit(rule)] ?? null;
}

/** For whoever is refused a case, or wants to assign one. */
export const exposureReason = (rule: ExposureRule, from: string): string =>
  `Within ${EXPOSURE_MONTHS} months a person opens at most ${exposureLimit(rule)} ${exposureLimit(rule) === 1 ? "case" : "cases"} of one kind. The next can be opened from ${from} on.`;

const familyOf = ({ id, kind, moduleId }: ExposedCheck): string =>
  OWN_KINDS.includes(kind) ? `${kind} ${moduleId} ${id}` : kind;
