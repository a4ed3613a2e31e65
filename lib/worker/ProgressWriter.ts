import "server-only";
import { reportProgress, type Report } from "@/lib/commands/reportProgress";
import type { JobName } from "@/lib/jobs/jobs";
import { log } from "@/lib/log";

const EVERY_MS = 250;

/** Writes how far a job is, at most four times a second and one write at a time; what comes in between is passed over. */
export class ProgressWriter {
  #latest: Report | null = null;
  #writing: Promise<void> = Promise.resolve();
  #timer: NodeJS.Timeout | null = null;
  #closed = false;

  constructor(
    private readonly subjectId: string,
    private readonly job: JobName,
    private readonly write = reportProgress,
  ) {}

  readonly progress = (done: number, total: number, step: string): void => {
    if (this.#closed) return;
    this.#latest = { done, total, step };
    this.#timer ??= setTimeout(() => void this.#flush(), EVERY_MS);
  };

  /** Nothing is written after this, so that the row may be cleared. */
  async close(): Promise<void> {
    this.#closed = true;
    if (this.#timer) clearTimeout(this.#timer);
    await this.#writing;
  }

  async #flush(): Promise<void> {
    const report = this.#latest;
    this.#latest = null;
    if (report) this.#writing = this.#store(report);
    await this.#writing;
    this.#timer = null;
    if (this.#latest && !this.#closed) this.#timer = setTimeout(() => void this.#flush(), EVERY_MS);
  }

  // The work itself does not depend on it.
  async #store(report: Report): Promise<void> {
    try {
      await this.write(this.subjectId, this.job, report);
    } catch (error) {
      log.warn({ error, job: this.job }, "progress not written");
    }
  }
}
