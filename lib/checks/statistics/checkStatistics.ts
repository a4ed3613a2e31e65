import { binomialBounds, type RateBounds } from "@/lib/numeric/binomialBounds";
import { quantile } from "@/lib/numeric/quantile";
import { discrimination, type Discrimination } from "./discrimination";
import { errorCounts, type ErrorCount } from "./errorCounts";

/** One case with its newest marking record. */
export type CountedCase = {
  sittingId: string;
  checkId: string;
  /** Of its check in its sitting, from 1. */
  number: number;
  met: boolean;
  /** From opening to hand-in. */
  seconds: number;
  byClock: boolean;
  /** Each quantity and class of error once, however many rows were outside with it. */
  outside: readonly { quantity: string; errorClass: string | null }[];
};

export type CheckStatistics = {
  checkId: string;
  cases: number;
  met: number;
  /** Of the rate at which first cases are met; null before there is one. */
  bounds: RateBounds | null;
  minutes: { lower: number; middle: number; upper: number } | null;
  byClock: number;
  fresh: { cases: number; met: number };
  errors: ErrorCount[];
  discrimination: Discrimination;
};

/** Of the bounds of a met rate; both sides together. */
const CONFIDENCE = 0.95;

/**
 * What the sittings of a release say of each of its checks. Only the first case of a check in a sitting counts, fresh ones
 * apart: whoever sits a fresh case has read the workings of the one before, and two cases of one person are not independent.
 * A case that its clock handed in counts with its whole time.
 */
export function checkStatistics(checkIds: readonly string[], cases: readonly CountedCase[]): CheckStatistics[] {
  const first = cases.filter(({ number }) => number === 1);
  return checkIds.map((checkId) => {
    const own = first.filter((one) => one.checkId === checkId);
    const fresh = cases.filter((one) => one.checkId === checkId && one.number > 1);
    const met = metOf(own);
    return {
      checkId,
      cases: own.length,
      met,
      bounds: own.length > 0 ? binomialBounds(met, own.length, CONFIDENCE) : null,
      minutes: minutesOf(own),
      byClock: own.filter(({ byClock }) => byClock).length,
      fresh: { cases: fresh.length, met: metOf(fresh) },
      errors: errorCounts(own),
      discrimination: discrimination(checkId, checkIds, first),
    };
  });
}

const metOf = (cases: readonly CountedCase[]) => cases.filter(({ met }) => met).length;

function minutesOf(cases: readonly CountedCase[]): CheckStatistics["minutes"] {
  if (cases.length === 0) return null;
  const minutes = cases.map(({ seconds }) => seconds / 60);
  const [lower, middle, upper] = [0.25, 0.5, 0.75].map((share) => quantile(minutes, share));
  return { lower, middle, upper };
}
