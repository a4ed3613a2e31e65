/** One part of the way from the antenna's phase centre to the pulse that is used. */
export type DelayPart = {
  /** Delay; below 0 for what makes the pulse earlier, such as a stated lead of the pulse output. */
  ns: number;
  /** Standard uncertainty, from 0. */
  uncertaintyNs: number;
  /**
   * Parts that share a cause, such as one velocity factor for two cables or one instrument for two readings, err
   * together; null for a part that errs on its own.
   */
  sharedCause: string | null;
};

export type DelayBudget = {
  totalNs: number;
  /** Standard uncertainty of the total. */
  uncertaintyNs: number;
  /** With coverage factor 2, about 95 %. */
  expandedNs: number;
};

/**
 * Sum of a delay budget. Independent uncertainties add as squares, JCGM 100:2008, 5.1.2; those of a shared cause first
 * add with the sign of their parts (full correlation, 5.2.2, note 1), for a scale that is wrong lengthens all of them
 * alike.
 */
export function delayBudget(parts: readonly DelayPart[]): DelayBudget {
  const together = new Map<string, number>();
  let totalNs = 0;
  let squares = 0;
  for (const { ns, uncertaintyNs, sharedCause } of parts) {
    if (!(uncertaintyNs >= 0)) throw new RangeError(`delayBudget: uncertainty from 0 ns, got ${uncertaintyNs}`);
    totalNs += ns;
    if (sharedCause === null) squares += uncertaintyNs * uncertaintyNs;
    else together.set(sharedCause, (together.get(sharedCause) ?? 0) + (ns < 0 ? -uncertaintyNs : uncertaintyNs));
  }
  for (const uncertaintyNs of together.values()) squares += uncertaintyNs * uncertaintyNs;
  const uncertaintyNs = Math.sqrt(squares);
  return { totalNs, uncertaintyNs, expandedNs: 2 * uncertaintyNs };
}

/**
 * Standard uncertainty of a value known only to lie within +-limit, all places alike: limit/sqrt(3), JCGM 100, 4.3.7.
 */
export const uncertaintyOfLimit = (limit: number): number => limit / Math.sqrt(3);

/** What a receiver makes of the value typed in. */
export type EntrySign = "delay-is-positive" | "delay-is-negative";

/** Value to type in so that the pulse stands right. */
export const entryValueNs = (totalNs: number, sign: EntrySign): number =>
  sign === "delay-is-positive" ? totalNs : -totalNs;

/** What is left of the delay after a value was typed in: 0 when right, twice the delay with the wrong sign. */
export const delayLeftNs = (totalNs: number, enteredNs: number, sign: EntrySign): number =>
  totalNs - (sign === "delay-is-positive" ? enteredNs : -enteredNs);
