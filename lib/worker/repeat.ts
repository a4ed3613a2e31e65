import "server-only";
import { log } from "@/lib/log";

/** Does something again and again, each time after the time before has ended; a failure is logged and tried again. */
export function repeat(name: string, everyMs: number, run: () => Promise<unknown>): { stop(): Promise<void> } {
  let stopping = false;
  let timer: NodeJS.Timeout;
  const once = async () => {
    try {
      await run();
    } catch (error) {
      log.error({ error, task: name }, "failed");
    }
    if (!stopping) schedule();
  };
  let running: Promise<void> = Promise.resolve();
  const schedule = () => (timer = setTimeout(() => (running = once()), everyMs));
  schedule();
  return {
    async stop() {
      stopping = true;
      clearTimeout(timer);
      await running;
    },
  };
}
