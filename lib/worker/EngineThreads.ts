import "server-only";
import { Worker } from "node:worker_threads";
import type { Progress } from "@/lib/checks/kind";
import { log } from "@/lib/log";
import type { EngineResult, EngineTask } from "./computeCase";
import type { EngineMessage } from "./engineThread";

type Waiting = { urgent: boolean; since: number; take: (thread: Worker) => void };

/** So long what is not urgent stands back; without an end it would never come to its turn on a busy day. */
const PATIENCE_MS = 30_000;

/**
 * Threads that compute, so that this process goes on polling, telling progress and sending mails. Each has loaded the
 * checks once and takes one task after the other; never more than so many compute at once. Who waits for a case goes before
 * a release check.
 */
export class EngineThreads {
  #idle: Worker[] = [];
  #all = new Set<Worker>();
  #waiting: Waiting[] = [];

  constructor(
    private readonly most: number,
    private readonly open = () => new Worker(new URL("./engineThread.ts", import.meta.url)),
  ) {}

  /** Loading the checks takes about a second; better before the first technician waits. */
  warm(): void {
    while (this.#all.size < this.most) this.#idle.push(this.#start());
  }

  /**
   * @param signal ends the computation where it stands; its thread is thrown away
   * @param urgent false for what may wait until nobody waits for a case
   */
  async run(task: EngineTask, progress: Progress, signal: AbortSignal, urgent = true): Promise<EngineResult> {
    signal.throwIfAborted();
    const thread = await this.#free(urgent, signal);
    if (signal.aborted) this.#release(thread);
    signal.throwIfAborted();
    return new Promise<EngineResult>((resolve, reject) => {
      const settle = (act: () => void) => {
        thread.removeAllListeners("message").removeListener("exit", onExit);
        signal.removeEventListener("abort", onAbort);
        act();
      };
      const onAbort = () => settle(() => (void thread.terminate(), reject(signal.reason as Error)));
      const onExit = () => settle(() => reject(new Error("EngineThreads: the thread died")));
      const onMessage = (message: EngineMessage) => {
        if (message.is === "progress") return progress(message.done, message.total, message.step);
        settle(() => this.#release(thread));
        if (message.is === "result") resolve(message.result);
        else reject(message.error as Error);
      };
      signal.addEventListener("abort", onAbort);
      thread.on("message", onMessage).on("exit", onExit);
      thread.postMessage(task);
    });
  }

  async stop(): Promise<void> {
    this.#waiting = [];
    await Promise.all([...this.#all].map((thread) => thread.terminate()));
  }

  #free(urgent: boolean, signal: AbortSignal): Promise<Worker> {
    const idle = this.#idle.pop() ?? (this.#all.size < this.most ? this.#start() : null);
    if (idle) return Promise.resolve(idle);
    return new Promise((resolve, reject) => {
      const onAbort = () => {
        this.#waiting = this.#waiting.filter((one) => one !== waiting);
        reject(signal.reason as Error);
      };
      const waiting: Waiting = {
        urgent,
        since: performance.now(),
        take: (thread) => {
          signal.removeEventListener("abort", onAbort);
          resolve(thread);
        },
      };
      signal.addEventListener("abort", onAbort);
      this.#waiting.push(waiting);
    });
  }

  #release(thread: Worker): void {
    const since = performance.now() - PATIENCE_MS;
    const next = this.#waiting.find((one) => one.urgent || one.since < since) ?? this.#waiting[0];
    if (!next) return void this.#idle.push(thread);
    this.#waiting = this.#waiting.filter((one) => one !== next);
    next.take(thread);
  }

  #start(): Worker {
    const thread = this.open();
    this.#all.add(thread);
    // A thread that fails outside a task (out of memory, a file that does not load) ends; its task is told by "exit".
    thread.on("error", (error) => log.error({ error }, "engine thread failed"));
    thread.on("exit", () => {
      this.#all.delete(thread);
      this.#idle = this.#idle.filter((idle) => idle !== thread);
      // Whoever waits gets one in its place.
      if (this.#waiting.length > 0) this.#release(this.#start());
    });
    return thread;
  }
}
