import "server-only";
import { availableParallelism } from "node:os";
import PgBoss from "pg-boss";
import { closeSittings } from "@/lib/commands/closeSittings";
import { reportFaults } from "@/lib/commands/reportFaults";
import { sealTrail, SEAL_BATCH } from "@/lib/commands/sealTrail";
import { db } from "@/lib/db";
import type { workerEnv } from "@/lib/env";
import { JOBS_SCHEMA } from "@/lib/jobs/jobs";
import { log } from "@/lib/log";
import { storage } from "@/lib/storage/storage";
import { mailDelivery } from "./deliverMail";
import { EngineThreads } from "./EngineThreads";
import { Lane } from "./Lane";
import { readIssuer } from "./readIssuer";
import { repeat } from "./repeat";
import { workerTasks } from "./tasks";

/** Two compute side by side at most: the machine also serves pages, and more workers can run elsewhere. */
const ENGINE_THREADS = Math.min(2, availableParallelism());
const SEAL_EVERY_MS = 2000;
const FAULTS_EVERY_MS = 5000;
/** Last days pass at midnight of many time zones, and a decider need not hear of it to the minute. */
const CLOSE_EVERY_MS = 60_000;
/** Less than the ten seconds after which whoever stops a process kills it (common practice, no source). */
const GRACE_MS = 6000;

/** One worker process; any number of them may run, on any number of machines. */
export async function startWorker(env: ReturnType<typeof workerEnv>): Promise<{ stop(): Promise<void> }> {
  const issuer = readIssuer(env);
  const threads = new EngineThreads(ENGINE_THREADS);
  threads.warm();
  const mail = mailDelivery(env);
  const queue = await openQueue(env.WORKER_DATABASE_URL);
  const tasks = workerTasks({
    ...{ ...issuer, threads, storage: storage(), seedKey: env.SEED_KEY, deliver: mail.deliver },
    ...{ publicOrigin: env.PUBLIC_ORIGIN, demonstration: env.DEMONSTRATION === "1" },
  });
  const lanes = [
    new Lane(queue, tasks, ["mark-case", "build-case"], ENGINE_THREADS),
    new Lane(queue, tasks, ["close-case", "mark-again"], 2),
    // Hundreds at a time and nobody waits: a lane of one, beside the cases of technicians who do.
    new Lane(queue, tasks, ["review-case"], 1),
    // One at a time, and of its slices none while a case waits for a thread.
    new Lane(queue, tasks, ["check-release"], 1),
    new Lane(queue, tasks, ["issue-certificate"], 1),
    // Strangers may ask for these; they hold up nothing of the chain.
    new Lane(queue, tasks, ["sign-verification"], 1),
    new Lane(queue, tasks, ["send-mail"], 4),
  ];
  for (const lane of lanes) lane.start();
  const repeated = [
    repeat("seal the trail", SEAL_EVERY_MS, () => sealAll(issuer.issuerKey.keyPem)),
    repeat("report faults", FAULTS_EVERY_MS, reportFaults),
    repeat("close sittings", CLOSE_EVERY_MS, () => closeSittings(env.PUBLIC_ORIGIN)),
  ];
  log.info({ threads: ENGINE_THREADS }, "worker ready");
  return {
    async stop() {
      await Promise.all([...lanes.map((lane) => lane.stop(GRACE_MS)), ...repeated.map((one) => one.stop())]);
      mail.close();
      await threads.stop();
      await queue.stop({ graceful: false });
      await db.close();
      log.info("worker stopped");
    },
  };
}

async function openQueue(connectionString: string): Promise<PgBoss> {
  const queue = new PgBoss({
    connectionString,
    schema: JOBS_SCHEMA,
    application_name: "lagmark worker",
    max: 4,
    // The owner makes the queue's tables; the worker's role could not.
    migrate: false,
    schedule: false,
    // How soon a killed worker's job is seen to be over its time.
    maintenanceIntervalSeconds: 5,
    archiveCompletedAfterSeconds: 3600,
    archiveFailedAfterSeconds: 14 * 86_400,
    deleteAfterDays: 30,
  });
  queue.on("error", (error) => log.error({ error }, "queue"));
  return queue.start();
}

async function sealAll(issuerKeyPem: string): Promise<void> {
  while ((await sealTrail(issuerKeyPem)) === SEAL_BATCH);
}
