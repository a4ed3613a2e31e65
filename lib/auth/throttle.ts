import "server-only";
import { createHash } from "node:crypto";
import { RateLimiterPostgres, RateLimiterRes } from "rate-limiter-flexible";
import { db } from "@/lib/db";
import { ThrottledError } from "@/lib/errors";

/** So many tries in so many seconds, counted from the first. */
export type Limit = { points: number; seconds: number };

/**
 * Count one try, in a table that every web process shares.
 * @throws ThrottledError with the wait, once the limit is passed
 */
export async function throttle(key: string, limit: Limit): Promise<void> {
  try {
    await limiterOf(limit).consume(stored(key));
  } catch (refusal) {
    if (!(refusal instanceof RateLimiterRes)) throw refusal;
    throw new ThrottledError(Math.max(1, Math.ceil(refusal.msBeforeNext / 1000)));
  }
}

/** Take one try back, because it turned out to be a right one. */
export async function forgive(key: string, limit: Limit): Promise<void> {
  await limiterOf(limit).reward(stored(key));
}

// Keys hold e-mail and network addresses, which nobody needs to read in a table.
const stored = (key: string) => createHash("sha256").update(key).digest("hex");

const limiters = new Map<string, RateLimiterPostgres>();

function limiterOf({ points, seconds }: Limit): RateLimiterPostgres {
  const keyPrefix = `${points}/${seconds}`;
  const known = limiters.get(keyPrefix);
  if (known) return known;
  const limiter = new RateLimiterPostgres({
    storeClient: db,
    storeType: "sequelize",
    tableName: "throttles",
    tableCreated: true,
    keyPrefix,
    points,
    duration: seconds,
  });
  limiters.set(keyPrefix, limiter);
  return limiter;
}
