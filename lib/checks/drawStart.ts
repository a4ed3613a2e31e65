import type { Random } from "@/lib/numeric/random";

const FIRST_MS = 1_767_225_600_000; // 2026-01-01T00:00:00Z
const MINUTES = 365 * 24 * 60;

/** A time of recording, whole minutes of the year 2026; drawn, because a case must not depend on a clock. */
export const drawStart = (random: Random): string =>
  new Date(FIRST_MS + random.integer(0, MINUTES - 1) * 60_000).toISOString();
