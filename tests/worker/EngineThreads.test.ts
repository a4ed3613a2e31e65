import { Worker } from "node:worker_threads";
import { afterEach, expect, test } from "vitest";
import type { EngineTask } from "@/lib/worker/computeCase";
import { EngineThreads } from "@/lib/worker/EngineThreads";

/** Answers each task with the seed it was given, after a moment; a task of the seed "dies" ends the thread. */
const ECHO = `
  const { parentPort } = require("node:worker_threads");
  parentPort.on("message", ({ seedHex }) => {
    if (seedHex === "dies") process.exit(1);
    setTimeout(() => parentPort.postMessage({ is: "result", result: { built: seedHex } }), 30);
  });`;

let started = 0;
const echo = () => {
  started += 1;
  return new Worker(ECHO, { eval: true });
};
const task = (seedHex: string) => ({ seedHex, plan: {}, answers: null }) as unknown as EngineTask;
const never = new AbortController().signal;

let threads: EngineThreads;
afterEach(() => threads.stop());
const use = (most: number) => {
  started = 0;
  threads = new EngineThreads(most, echo);
};
const run = (seedHex: string, { urgent = true, signal = never } = {}) =>
  threads.run(task(seedHex), () => undefined, signal, urgent);

test("no more threads than so many, however much is asked", async () => {
  use(2);
  threads.warm();
  const results = await Promise.all(["a", "b", "c", "d", "e"].map((seed) => run(seed)));
  expect(results).toEqual(["a", "b", "c", "d", "e"].map((built) => ({ built })));
  expect(started).toBe(2);
});

test("who waits for a case goes before a slice of a release check that asked first", async () => {
  use(1);
  const order: string[] = [];
  const note = (name: string, urgent: boolean) => run(name, { urgent }).then(() => order.push(name));
  await Promise.all([note("first", true), note("slice", false), note("case", true), note("another", true)]);
  expect(order).toEqual(["first", "case", "another", "slice"]);
});

test("who is stopped while waiting waits no more, and who is stopped already never begins", async () => {
  use(1);
  const abort = new AbortController();
  const first = run("first");
  const waiting = run("waits", { urgent: false, signal: abort.signal });
  abort.abort(new Error("told to stop"));
  await expect(waiting).rejects.toThrow("told to stop");
  await expect(run("late", { signal: abort.signal })).rejects.toThrow("told to stop");
  expect(await first).toEqual({ built: "first" });
  expect(await run("next")).toEqual({ built: "next" });
  expect(started).toBe(1);
});

test("a thread that is thrown away or dies is replaced for whoever waits", async () => {
  use(1);
  const abort = new AbortController();
  const stopped = run("stopped", { signal: abort.signal });
  const waiting = run("waits");
  await new Promise((resolve) => setImmediate(resolve));
  abort.abort(new Error("told to stop"));
  await expect(stopped).rejects.toThrow("told to stop");
  expect(await waiting).toEqual({ built: "waits" });
  const dies = run("dies");
  const after = run("after");
  await expect(dies).rejects.toThrow("the thread died");
  expect(await after).toEqual({ built: "after" });
});
