import path from "node:path";
import { pathToFileURL } from "node:url";
import { Worker } from "node:worker_threads";
import { ConflictError } from "@/lib/errors";
import { LIMITS } from "@/lib/mdx/limits";
import { unread, type ParsedModule } from "@/lib/mdx/parsedModule";
import { problemAt } from "@/lib/mdx/problem";

/**
 * Parses in a thread that is ended when it takes too long. One thread is kept and reads one text at a time, so that ending it
 * costs nobody else anything; the next text starts a new one.
 */
export async function parseInThread(text: string, limitMs: number = LIMITS.readingMs): Promise<ParsedModule> {
  if (queue.waiting >= LIMITS.waitingReadings) {
    throw new ConflictError("Many modules are being read at this moment. Try again in a minute.");
  }
  queue.waiting++;
  const turn = queue.last.then(() => parseAlone(text, limitMs)).finally(() => void queue.waiting--);
  queue.last = turn.catch(() => undefined);
  return turn;
}

type Queue = { waiting: number; last: Promise<unknown>; thread: Worker | null };
const shared = globalThis as { lagmarkParser?: Queue };
// Pages, route handlers and each hot reload get copies of this file; the thread is to be one.
const queue = (shared.lagmarkParser ??= { waiting: 0, last: Promise.resolve(), thread: null });

type Message = { ready: true } | { parsed: ParsedModule };

async function parseAlone(text: string, limitMs: number): Promise<ParsedModule> {
  const worker = (queue.thread ??= await startThread());
  worker.ref();
  worker.postMessage(text);
  const message = await nextMessage(worker, limitMs);
  if (message !== null && "parsed" in message) {
    // An idle thread must not keep a script or a test from ending.
    worker.unref();
    return message.parsed;
  }
  await worker.terminate();
  return unread([tooLong(limitMs)]);
}

const tooLong = (limitMs: number) =>
  problemAt(
    { line: 1, column: 1 },
    "time",
    `Reading this module was stopped after ${limitMs / 1000} s. Long blocks full of * _ [ or $ are the usual cause: put empty lines between their parts.`,
  );

/** The path is put together at run time, out of sight of the bundler, which would try to make a page of the file. */
async function startThread(): Promise<Worker> {
  const file = path.join(process.cwd(), "lib", "mdx", "parserThread.mjs");
  const worker = new Worker(pathToFileURL(file), { execArgv: [], resourceLimits: { maxOldGenerationSizeMb: 256 } });
  worker.once("exit", () => {
    if (queue.thread === worker) queue.thread = null;
  });
  const message = await nextMessage(worker, LIMITS.threadStartMs);
  if (message !== null) return worker;
  await worker.terminate();
  throw new Error("The parser thread did not start");
}

/** The thread's next message, or null when the time is over or the thread ended itself, as it does when memory runs out. */
function nextMessage(worker: Worker, limitMs: number): Promise<Message | null> {
  return new Promise((resolve, reject) => {
    const onMessage = (message: Message) => settle(() => resolve(message));
    const onExit = () => settle(() => resolve(null));
    const onError = (error: Error & { code?: string }) =>
      settle(() => (error.code === "ERR_WORKER_OUT_OF_MEMORY" ? resolve(null) : reject(error)));
    const timer = setTimeout(onExit, limitMs);
    const settle = (act: () => void) => {
      clearTimeout(timer);
      worker.off("message", onMessage).off("exit", onExit).off("error", onError);
      act();
    };
    worker.on("message", onMessage).on("exit", onExit).on("error", onError);
  });
}
