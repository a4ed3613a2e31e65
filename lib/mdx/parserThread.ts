import { parentPort } from "node:worker_threads";
import { parseModule } from "@/lib/mdx/parseModule";

/** Runs in a thread of its own, because a hostile text can keep the parser busy for minutes: see parseInThread.ts. */
parentPort?.on("message", (text: string) => parentPort?.postMessage({ parsed: parseModule(text) }));
parentPort?.postMessage({ ready: true });
