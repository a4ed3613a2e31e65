import { parentPort } from "node:worker_threads";
import { computeCase, type EngineResult, type EngineTask } from "./computeCase";

/** From the thread: how far it is, then one result or one error. */
export type EngineMessage =
  | { is: "progress"; done: number; total: number; step: string }
  | { is: "result"; result: EngineResult }
  | { is: "error"; error: unknown };

const port = parentPort;
if (!port) throw new Error("engineThread: to be started as a worker thread");
const post = (message: EngineMessage) => port.postMessage(message);

port.on("message", (task: EngineTask) => {
  try {
    post({
      is: "result",
      result: computeCase(task, (done, total, step) => post({ is: "progress", done, total, step })),
    });
  } catch (error) {
    post({ is: "error", error });
  }
});
