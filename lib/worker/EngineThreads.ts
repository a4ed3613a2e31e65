import "server-only";
import { Worker } from "node:worker_threads";
import type { Progress } from "@/lib/checks/kind";
import { log } from "@/lib/log";
import type { EngineResult, EngineTask } from "./computeCase";
import type { EngineMessage } from "./engineThread";

/**
 * Threads that compute, so that this process goes on polling, telling progress and sending mails. Each has loaded the
 * checks once and takes one task after the other. There are as many as tasks at once: the lane sets the bound.
 */
export class EngineThreads {
  #idle: Worker[] = [];
  #all = new Set<Worker>();

  /** Loading the checks takes about a second; better before the first technician waits. */
  warm(threads: number): void {
    for (let count = 0; count < threads; count += 1) this.#idle.push(this.#start());
  }

  /** @param signal ends the computation where it stands; its thread is thrown away */
  run(task: EngineTask, progress: Progress, signal: AbortSignal): Promise<EngineResult> {
    const thread = this.#idle.pop() ?? this.#start();
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
        settle(() => this.#idle.push(thread));
        if (message.is === "result") resolve(message.result);
        else reject(message.error as Error);
      };
      if (signal.aborted) return onAbort();
      signal.addEventListener("abort", onAbort);
      thread.on("message", onMessage).on("exit", onExit);
      thread.postMessage(task);
    });
  }

  async stop(): Promise<void> {
    await Promise.all([...this.#all].map((thread) => thread.terminate()));
  }

  #start(): Worker {
    const thread = new Worker(new URL("./engineThread.ts", import.meta.url));
    this.#all.add(thread);
    // A thread that fails outside a task (out of memory, a file that does not load) ends; its task is told by "exit".
    thread.on("error", (error) => log.error({ error }, "engine thread failed"));
    thread.on("exit", () => {
      this.#all.delete(thread);
      this.#idle = this.#idle.filter((idle) => idle !== thread);
    });
    return thread;
  }
}
