import "server-only";
import type PgBoss from "pg-boss";
import { setTimeout as wait } from "node:timers/promises";
import { referenceOf } from "@/lib/commands/reportFaults";
import { JOBS, JOBS_SCHEMA, type JobName, type JobPayload } from "@/lib/jobs/jobs";
import { describeError, log } from "@/lib/log";

/** One run of one job. The signal comes when it took longer than it may, or when the process must stop. */
export type Task<Name extends JobName> = (payload: JobPayload<Name>, signal: AbortSignal) => Promise<unknown>;
export type Tasks = { [Name in JobName]: Task<Name> };

export type Queue = Pick<PgBoss, "fetch" | "complete" | "fail" | "getDb">;
type Running = { name: JobName; abort: AbortController; ended: Promise<void> };

const POLL_MS = 500;
/** Of the time after which the queue counts a run as lost: this process should be the first to say that it failed. */
const SHARE_OF_TIME = 0.9;
const STOPPED = new Error("Lane: this worker stops");

/**
 * Takes jobs of these names while it has a slot free, and runs each by itself: one that fails or takes long holds up
 * neither its neighbours nor another lane. A library call per batch would end a batch with its slowest and fail it as one.
 */
export class Lane {
  #running = new Map<string, Running>();
  #stopping = false;
  #polling: Promise<void> | null = null;
  #wake: () => void = () => undefined;

  constructor(
    private readonly queue: Queue,
    private readonly tasks: Tasks,
    private readonly names: JobName[],
    private readonly slots: number,
  ) {}

  start(): void {
    this.#polling = this.#poll();
  }

  /** Takes nothing new, lets what runs finish for a while, and gives the rest back for another worker to run at once. */
  async stop(graceMs: number): Promise<void> {
    this.#stopping = true;
    this.#wake();
    await this.#polling;
    const ended = Promise.all([...this.#running.values()].map((run) => run.ended));
    await Promise.race([ended, wait(graceMs, undefined, { ref: false })]);
    for (const [id, { name, abort }] of this.#running) {
      await this.#giveBack(name, [id]);
      abort.abort(STOPPED);
    }
  }

  async #poll(): Promise<void> {
    while (!this.#stopping) {
      await this.#take();
      await this.#pause();
      // The next name gets the first free slot.
      this.names.push(this.names.shift()!);
    }
  }

  async #take(): Promise<void> {
    for (const name of this.names) {
      const batchSize = this.slots - this.#running.size;
      if (batchSize <= 0) return;
      const jobs = await this.queue.fetch<object>(name, { batchSize });
      const ids = jobs.map(({ id }) => id);
      if (this.#stopping) return this.#giveBack(name, ids);
      for (const job of jobs) this.#begin(name, job);
    }
  }

  // With every slot taken there is nothing to ask for until one is free.
  async #pause(): Promise<void> {
    if (this.#stopping) return;
    const full = this.#running.size >= this.slots;
    await new Promise<void>((resolve) => {
      const timer = full ? undefined : setTimeout(resolve, POLL_MS);
      this.#wake = () => {
        if (!full && !this.#stopping) return;
        clearTimeout(timer);
        resolve();
      };
    });
  }

  #begin(name: JobName, job: PgBoss.Job<object>): void {
    const abort = new AbortController();
    const ended = this.#run(name, job, abort).finally(() => {
      this.#running.delete(job.id);
      this.#wake();
    });
    this.#running.set(job.id, { name, abort, ended });
  }

  async #run(name: JobName, { id, data, expireInSeconds }: PgBoss.Job<object>, abort: AbortController): Promise<void> {
    const started = performance.now();
    const about = { job: name, id, ...data };
    const tooLong = () => abort.abort(new Error(`Lane: ${name} took longer than it may`));
    const timer = setTimeout(tooLong, expireInSeconds * 1000 * SHARE_OF_TIME);
    try {
      const outcome = await Promise.race([this.#perform(name, data, abort.signal), aborted(abort.signal)]);
      log.info({ ...about, outcome, ms: Math.round(performance.now() - started) }, "done");
      await this.queue.complete(name, id);
    } catch (error) {
      if (abort.signal.reason === STOPPED) return;
      log.error({ ...about, error, reference: referenceOf(id) }, "failed");
      await this.#fail(name, id, error);
    } finally {
      clearTimeout(timer);
    }
  }

  #perform<Name extends JobName>(name: Name, data: object, signal: AbortSignal): Promise<unknown> {
    const payload = JOBS[name].payload.parse(data) as JobPayload<Name>;
    return (this.tasks[name] as Task<Name>)(payload, signal);
  }

  // The web process may read the queue's tables, so an error's own words, which may hold values, stay out of them.
  async #fail(name: JobName, id: string, error: unknown): Promise<void> {
    try {
      await this.queue.fail(name, id, { error: describeError(error).name, reference: referenceOf(id) });
    } catch (unwritten) {
      log.error({ job: name, id, error: unwritten }, "failure not written; the job runs again when its time is over");
    }
  }

  // Not the library's fail(): a stop is no try, and must not bring a job nearer to its last one.
  async #giveBack(name: JobName, ids: string[]): Promise<void> {
    if (ids.length === 0) return;
    await this.queue.getDb().executeSql(GIVE_BACK, [name, ids]);
    log.info({ job: name, ids }, "given back");
  }
}

const aborted = (signal: AbortSignal) =>
  new Promise<never>((_, reject) => {
    if (signal.aborted) reject(signal.reason as Error);
    signal.addEventListener("abort", () => reject(signal.reason as Error), { once: true });
  });

const GIVE_BACK = `
  UPDATE ${JOBS_SCHEMA}.job SET state = 'retry', started_on = NULL, start_after = now()
  WHERE name = $1 AND id = ANY ($2::uuid[]) AND state = 'active'`;
