import { afterEach, expect, test, vi } from "vitest";
import { forgive, throttle } from "@/lib/auth/throttle";
import { ThrottledError } from "@/lib/errors";
import { minutesFrom, NOW } from "@/tests/support/clock";
import { ownerRows } from "@/tests/support/owner";

const LIMIT = { points: 3, seconds: 600 };

// The library counts by the process's own clock.
const at = (minutes: number) => vi.useFakeTimers({ toFake: ["Date"], now: minutesFrom(NOW, minutes) });
afterEach(() => void vi.useRealTimers());

test("refuses the try past the limit and says how long to wait", async () => {
  at(0);
  for (let n = 0; n < LIMIT.points; n += 1) await throttle("roof", LIMIT);
  at(4);
  await expect(throttle("roof", LIMIT)).rejects.toThrow(new ThrottledError(360));
  await throttle("another key", LIMIT);
});

test("counts anew once the time is over", async () => {
  at(0);
  for (let n = 0; n <= LIMIT.points; n += 1) await throttle("roof", LIMIT).catch(() => undefined);
  at(11);
  await expect(throttle("roof", LIMIT)).resolves.toBeUndefined();
});

test("a try that is taken back does not count", async () => {
  at(0);
  for (let n = 0; n < 9; n += 1) {
    await throttle("roof", LIMIT);
    await forgive("roof", LIMIT);
  }
  await expect(throttle("roof", LIMIT)).resolves.toBeUndefined();
});

test("tries made at once are all counted", async () => {
  at(0);
  const tries = await Promise.allSettled(Array.from({ length: 8 }, () => throttle("roof", LIMIT)));
  expect(tries.filter((each) => each.status === "fulfilled")).toHaveLength(LIMIT.points);
});

test("keeps no address in the table", async () => {
  at(0);
  await throttle("ines@example.test from 192.0.2.7", LIMIT);
  const [row] = await ownerRows<{ key: string }>("SELECT key FROM throttles");
  expect(row?.key).toMatch(/^3\/600:[0-9a-f]{64}$/);
});
