import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { log } from "@/lib/log";
import { repeat } from "@/lib/worker/repeat";

beforeEach(() => {
  vi.useFakeTimers();
  log.level = "silent";
});
afterEach(() => void vi.useRealTimers());

test("the next time waits until the time before has ended", async () => {
  let ended = () => undefined as void;
  let begun = 0;
  const repeated = repeat("seal", 1000, () => ((begun += 1), new Promise<void>((resolve) => (ended = resolve))));
  await vi.advanceTimersByTimeAsync(10_000);
  expect(begun).toBe(1);
  ended();
  await vi.advanceTimersByTimeAsync(1000);
  expect(begun).toBe(2);
  ended();
  await repeated.stop();
});

test("goes on after a failure", async () => {
  let begun = 0;
  const repeated = repeat("seal", 1000, () => ((begun += 1), Promise.reject(new Error("no connection"))));
  await vi.advanceTimersByTimeAsync(3500);
  expect(begun).toBe(3);
  await repeated.stop();
});

test("a stop waits for the time that runs, and none follows", async () => {
  let ended = () => undefined as void;
  let begun = 0;
  const repeated = repeat("seal", 1000, () => ((begun += 1), new Promise<void>((resolve) => (ended = resolve))));
  await vi.advanceTimersByTimeAsync(1000);
  let stopped = false;
  const stopping = repeated.stop().then(() => (stopped = true));
  await vi.advanceTimersByTimeAsync(5000);
  expect(stopped).toBe(false);
  ended();
  await stopping;
  await vi.advanceTimersByTimeAsync(5000);
  expect(begun).toBe(1);
});
