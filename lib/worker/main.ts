// node --import ./scripts/register.mjs lib/worker/main.ts
import { workerEnv } from "@/lib/env";
import { log } from "@/lib/log";
import { startWorker } from "./startWorker";

// Node's own report would print a database error with every value in its statement.
for (const event of ["uncaughtException", "unhandledRejection"] as const) {
  process.on(event, (error: unknown) => {
    log.fatal({ error }, event);
    process.exit(1);
  });
}

const worker = await startWorker(workerEnv());
let stopping = false;
for (const signal of ["SIGTERM", "SIGINT"] as const) {
  process.on(signal, () => {
    if (stopping) return;
    stopping = true;
    log.info({ signal }, "stopping");
    void worker.stop().then(() => process.exit(0));
  });
}
