import { afterEach, beforeEach, expect, test, vi } from "vitest";
import type { Report } from "@/lib/commands/reportProgress";
import { log } from "@/lib/log";
import { ProgressWriter } from "@/lib/worker/ProgressWriter";

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

function writer(write: () => Promise<void> = () => Promise.resolve()) {
  const written: Report[] = [];
  const made = new ProgressWriter("case", "mark-case", async (_subject, _job, report) => {
    written.push(report);
    await write();
  });
  return { made, written };
}

test("a thousand reports in a second are written four times, the newest each time", async () => {
  const { made, written } = writer();
  for (let n = 0; n < 1000; n += 1) {
    made.progress(n, 1000, "acquiring");
    await vi.advanceTimersByTimeAsync(1);
  }
  expect(written).toHaveLength(4);
  expect(written.at(-1)).toEqual({ done: 999, total: 1000, step: "acquiring" });
});

test("the last report is written though nothing follows it", async () => {
  const { made, written } = writer();
  made.progress(1, 2, "drawing");
  await vi.advanceTimersByTimeAsync(250);
  made.progress(2, 2, "drawing");
  await vi.advanceTimersByTimeAsync(250);
  expect(written.map(({ done }) => done)).toEqual([1, 2]);
});

test("a slow write is not overtaken by the next one", async () => {
  let finish = () => undefined as void;
  const { made, written } = writer(() => new Promise((resolve) => (finish = resolve)));
  made.progress(1, 3, "drawing");
  await vi.advanceTimersByTimeAsync(250);
  made.progress(2, 3, "drawing");
  await vi.advanceTimersByTimeAsync(2000);
  expect(written).toHaveLength(1);
  finish();
  await vi.advanceTimersByTimeAsync(250);
  expect(written.map(({ done }) => done)).toEqual([1, 2]);
});

test("closing waits for the write on its way, and nothing is written after it", async () => {
  let finish = () => undefined as void;
  const { made, written } = writer(() => new Promise((resolve) => (finish = resolve)));
  made.progress(1, 3, "drawing");
  await vi.advanceTimersByTimeAsync(250);
  made.progress(2, 3, "drawing");
  let closed = false;
  const closing = made.close().then(() => (closed = true));
  await vi.advanceTimersByTimeAsync(1000);
  expect(closed).toBe(false);
  finish();
  await closing;
  made.progress(3, 3, "drawing");
  await vi.advanceTimersByTimeAsync(1000);
  expect(written).toHaveLength(1);
});

test("a write that fails does not end the work", async () => {
  log.level = "silent";
  let fail = true;
  const { made, written } = writer(() => (fail ? Promise.reject(new Error("no connection")) : Promise.resolve()));
  made.progress(1, 2, "drawing");
  await vi.advanceTimersByTimeAsync(250);
  fail = false;
  made.progress(2, 2, "drawing");
  await vi.advanceTimersByTimeAsync(250);
  expect(written).toHaveLength(2);
});
