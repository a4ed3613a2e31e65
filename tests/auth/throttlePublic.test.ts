import { afterEach, expect, test, vi } from "vitest";
import { throttlePublic } from "@/lib/auth/throttlePublic";
import { NOW } from "@/tests/support/clock";

afterEach(() => void vi.useRealTimers());

const from = (addresses: string) => new Headers({ "x-forwarded-for": addresses });

test("thirty look-ups a minute and no more, whatever the sender claims to be forwarded for", async () => {
  vi.useFakeTimers({ toFake: ["Date"], now: NOW });
  for (let n = 0; n < 30; n += 1) expect(await throttlePublic(from(`198.51.100.${n}, 192.0.2.7`))).toBe(true);
  expect(await throttlePublic(from("203.0.113.1, 192.0.2.7"))).toBe(false);
  expect(await throttlePublic(from("192.0.2.8"))).toBe(true);
});
