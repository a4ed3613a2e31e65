import type { EntrySign } from "@/lib/gnss/timing/delayBudget";

/** What a receiver's sheet may say of the sign. Our own words, the ways that receivers differ: common practice, no source. */
export const NOTES: Readonly<Record<EntrySign, readonly string[]>> = {
  "delay-is-positive": [
    "A delay between antenna and clock is typed as a positive number.",
    "A positive number makes the pulse leave earlier, a negative one later.",
  ],
  "delay-is-negative": [
    "A positive number makes the pulse leave later, a negative one earlier.",
    "What makes the pulse late is typed with a minus sign.",
  ],
};
